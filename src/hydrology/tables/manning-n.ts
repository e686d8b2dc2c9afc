/** Manning's roughness coefficient n of one kind of channel, s m-1/3. */
export interface ManningRow {
  /** As records name it: kind and description, parted by a comma. */
  readonly class: string;
  readonly lowest: number;
  /** Null where the table has a dash. */
  readonly normal: number | null;
  readonly highest: number | null;
}

export const manningSource =
  'Chow, V. T. (1959) Open-Channel Hydraulics. McGraw-Hill, New York, Table 5-6, pp. 110-113';

type Row = readonly [
  kind: string,
  description: string,
  lowest: number,
  normal: number | null,
  highest: number | null,
];

/**
 * Rows with three numbers read in two public copies of Chow's table, its dashes from memory. "Same as above" is
 * written out. Overland flow stands in other tables.
 */
const rows: readonly Row[] = [
  ['minor stream on plain', 'clean, straight, full stage, no rifts or deep pools', 0.025, 0.03, 0.033],
  ['minor stream on plain', 'clean, straight, full stage, more stones and weeds', 0.03, 0.035, 0.04],
  ['minor stream on plain', 'clean, winding, some pools and shoals', 0.033, 0.04, 0.045],
  [
    'minor stream on plain',
    'clean, winding, some pools and shoals, some weeds and stones',
    0.035,
    0.045,
    0.05,
  ],
  [
    'minor stream on plain',
    'clean, winding, lower stages, more ineffective slopes and sections',
    0.04,
    0.048,
    0.055,
  ],
  ['minor stream on plain', 'clean, winding, some weeds and more stones', 0.045, 0.05, 0.06],
  ['minor stream on plain', 'sluggish reaches, weedy, deep pools', 0.05, 0.07, 0.08],
  [
    'minor stream on plain',
    'very weedy reaches, deep pools, or floodways with heavy stand of timber and underbrush',
    0.075,
    0.1,
    0.15,
  ],
  ['mountain stream', 'bottom: gravels, cobbles, few boulders', 0.03, 0.04, 0.05],
  ['mountain stream', 'bottom: cobbles with large boulders', 0.04, 0.05, 0.07],
  ['major stream', 'regular section with no boulders or brush', 0.025, null, 0.06],
  ['major stream', 'irregular and rough section', 0.035, null, 0.1],
  ['flood plain, pasture', 'no brush, short grass', 0.025, 0.03, 0.035],
  ['flood plain, pasture', 'no brush, high grass', 0.03, 0.035, 0.05],
  ['flood plain, cultivated', 'no crop', 0.02, 0.03, 0.04],
  ['flood plain, cultivated', 'mature row crops', 0.025, 0.035, 0.045],
  ['flood plain, cultivated', 'mature field crops', 0.03, 0.04, 0.05],
  ['flood plain, brush', 'scattered brush, heavy weeds', 0.035, 0.05, 0.07],
  ['flood plain, brush', 'light brush and trees, winter', 0.035, 0.05, 0.06],
  ['flood plain, brush', 'light brush and trees, summer', 0.04, 0.06, 0.08],
  ['flood plain, brush', 'medium to dense brush, winter', 0.045, 0.07, 0.11],
  ['flood plain, brush', 'medium to dense brush, summer', 0.07, 0.1, 0.16],
  ['flood plain, trees', 'dense willows, summer, straight', 0.11, 0.15, 0.2],
  ['flood plain, trees', 'cleared land with tree stumps, no sprouts', 0.03, 0.04, 0.05],
  ['flood plain, trees', 'cleared land with tree stumps, heavy growth of sprouts', 0.05, 0.06, 0.08],
  [
    'flood plain, trees',
    'heavy stand of timber, few down trees, little undergrowth, flood stage below branches',
    0.08,
    0.1,
    0.12,
  ],
  [
    'flood plain, trees',
    'heavy stand of timber, few down trees, little undergrowth, flood stage reaching branches',
    0.1,
    0.12,
    0.16,
  ],
  ['earth, straight and uniform', 'clean, recently completed', 0.016, 0.018, 0.02],
  ['earth, straight and uniform', 'clean, after weathering', 0.018, 0.022, 0.025],
  ['earth, straight and uniform', 'gravel, uniform section, clean', 0.022, 0.025, 0.03],
  ['earth, straight and uniform', 'with short grass, few weeds', 0.022, 0.027, 0.033],
  ['earth, winding and sluggish', 'no vegetation', 0.023, 0.025, 0.03],
  ['earth, winding and sluggish', 'grass, some weeds', 0.025, 0.03, 0.033],
  ['earth, winding and sluggish', 'dense weeds or aquatic plants in deep channels', 0.03, 0.035, 0.04],
  ['earth, winding and sluggish', 'earth bottom and rubble sides', 0.028, 0.03, 0.035],
  ['earth, winding and sluggish', 'stony bottom and weedy banks', 0.025, 0.035, 0.04],
  ['earth, winding and sluggish', 'cobble bottom and clean sides', 0.03, 0.04, 0.05],
  ['channels not maintained', 'dense weeds, high as flow depth', 0.05, 0.08, 0.12],
  ['channels not maintained', 'clean bottom, brush on sides', 0.04, 0.05, 0.08],
  ['channels not maintained', 'clean bottom, brush on sides, highest stage of flow', 0.045, 0.07, 0.11],
  ['channels not maintained', 'dense brush, high stage', 0.08, 0.1, 0.14],
  ['lined or built-up', 'concrete, trowel finish', 0.011, 0.013, 0.015],
  ['lined or built-up', 'concrete, float finish', 0.013, 0.015, 0.016],
  ['lined or built-up', 'concrete, unfinished', 0.014, 0.017, 0.02],
  ['lined or built-up', 'gravel bottom, sides of dry rubble or riprap', 0.023, 0.033, 0.036],
  ['lined or built-up', 'dry rubble masonry', 0.023, 0.032, 0.035],
  ['lined or built-up', 'asphalt, smooth', 0.013, 0.013, null],
  ['lined or built-up', 'asphalt, rough', 0.016, 0.016, null],
  ['closed conduit flowing partly full', 'corrugated metal, storm drain', 0.021, 0.024, 0.03],
  ['closed conduit flowing partly full', 'concrete culvert, straight and free of debris', 0.01, 0.011, 0.013],
  ['closed conduit flowing partly full', 'vitrified clay sewer', 0.011, 0.014, 0.017],
];

export const manningN: readonly ManningRow[] = rows.map(([kind, description, lowest, normal, highest]) => ({
  class: `${kind}, ${description}`,
  lowest,
  normal,
  highest,
}));
