/** Hydrologic soil groups, from sand to clay. */
export const soilGroups = ['A', 'B', 'C', 'D'] as const;
export type SoilGroup = (typeof soilGroups)[number];

/** Runoff curve numbers of one cover, for average antecedent runoff (ARC II) and an initial abstraction of 0.2 S. */
export interface CurveNumberRow {
  /** As records name it: cover, treatment and condition, parted by commas. */
  readonly class: string;
  /** Of TR-55. */
  readonly table: '2-2a' | '2-2b' | '2-2c';
  readonly cover: string;
  readonly treatment: string | null;
  readonly condition: 'poor' | 'fair' | 'good' | null;
  /** Of the cover as the table has it; null where it says nothing. */
  readonly sealedPercent: number | null;
  readonly numbers: Readonly<Record<SoilGroup, number>>;
}

export const curveNumberSource =
  'USDA-NRCS (1986) Urban Hydrology for Small Watersheds, TR-55, 2nd ed., Table 2-2; the same values in the National Engineering Handbook, Part 630, ch. 9 (2004), Tables 9-1 and 9-5';

type Row = readonly [
  table: CurveNumberRow['table'],
  cover: string,
  treatment: string | null,
  condition: CurveNumberRow['condition'],
  sealedPercent: number | null,
  A: number,
  B: number,
  C: number,
  D: number,
];

/**
 * Read in two public copies of TR-55 Table 2-2; the desert rows in one. Older printings (NEH-4) have 25 for good woods on
 * group A.
 */
const rows: readonly Row[] = [
  ['2-2a', 'open space', null, 'poor', null, 68, 79, 86, 89],
  ['2-2a', 'open space', null, 'fair', null, 49, 69, 79, 84],
  ['2-2a', 'open space', null, 'good', null, 39, 61, 74, 80],
  ['2-2a', 'paved parking, roofs, streets with curbs', null, null, 100, 98, 98, 98, 98],
  ['2-2a', 'paved road with open ditches', null, null, null, 83, 89, 92, 93],
  ['2-2a', 'gravel road', null, null, null, 76, 85, 89, 91],
  ['2-2a', 'dirt road', null, null, null, 72, 82, 87, 89],
  ['2-2a', 'natural desert landscaping', null, null, null, 63, 77, 85, 88],
  ['2-2a', 'artificial desert landscaping', null, null, null, 96, 96, 96, 96],
  ['2-2a', 'commercial and business', null, null, 85, 89, 92, 94, 95],
  ['2-2a', 'industrial', null, null, 72, 81, 88, 91, 93],
  ['2-2a', 'residential, 1/8 acre or less', null, null, 65, 77, 85, 90, 92],
  ['2-2a', 'residential, 1/4 acre', null, null, 38, 61, 75, 83, 87],
  ['2-2a', 'residential, 1/3 acre', null, null, 30, 57, 72, 81, 86],
  ['2-2a', 'residential, 1/2 acre', null, null, 25, 54, 70, 80, 85],
  ['2-2a', 'residential, 1 acre', null, null, 20, 51, 68, 79, 84],
  ['2-2a', 'residential, 2 acres', null, null, 12, 46, 65, 77, 82],
  ['2-2a', 'newly graded area', null, null, null, 77, 86, 91, 94],
  ['2-2b', 'fallow', 'bare soil', null, null, 77, 86, 91, 94],
  ['2-2b', 'fallow', 'crop residue', 'poor', null, 76, 85, 90, 93],
  ['2-2b', 'fallow', 'crop residue', 'good', null, 74, 83, 88, 90],
  ['2-2b', 'row crops', 'straight row', 'poor', null, 72, 81, 88, 91],
  ['2-2b', 'row crops', 'straight row', 'good', null, 67, 78, 85, 89],
  ['2-2b', 'row crops', 'straight row with crop residue', 'poor', null, 71, 80, 87, 90],
  ['2-2b', 'row crops', 'straight row with crop residue', 'good', null, 64, 75, 82, 85],
  ['2-2b', 'row crops', 'contoured', 'poor', null, 70, 79, 84, 88],
  ['2-2b', 'row crops', 'contoured', 'good', null, 65, 75, 82, 86],
  ['2-2b', 'row crops', 'contoured with crop residue', 'poor', null, 69, 78, 83, 87],
  ['2-2b', 'row crops', 'contoured with crop residue', 'good', null, 64, 74, 81, 85],
  ['2-2b', 'row crops', 'contoured and terraced', 'poor', null, 66, 74, 80, 82],
  ['2-2b', 'row crops', 'contoured and terraced', 'good', null, 62, 71, 78, 81],
  ['2-2b', 'row crops', 'contoured and terraced with crop residue', 'poor', null, 65, 73, 79, 81],
  ['2-2b', 'row crops', 'contoured and terraced with crop residue', 'good', null, 61, 70, 77, 80],
  ['2-2b', 'small grain', 'straight row', 'poor', null, 65, 76, 84, 88],
  ['2-2b', 'small grain', 'straight row', 'good', null, 63, 75, 83, 87],
  ['2-2b', 'small grain', 'straight row with crop residue', 'poor', null, 64, 75, 83, 86],
  ['2-2b', 'small grain', 'straight row with crop residue', 'good', null, 60, 72, 80, 84],
  ['2-2b', 'small grain', 'contoured', 'poor', null, 63, 74, 82, 85],
  ['2-2b', 'small grain', 'contoured', 'good', null, 61, 73, 81, 84],
  ['2-2b', 'small grain', 'contoured with crop residue', 'poor', null, 62, 73, 81, 84],
  ['2-2b', 'small grain', 'contoured with crop residue', 'good', null, 60, 72, 80, 83],
  ['2-2b', 'small grain', 'contoured and terraced', 'poor', null, 61, 72, 79, 82],
  ['2-2b', 'small grain', 'contoured and terraced', 'good', null, 59, 70, 78, 81],
  ['2-2b', 'small grain', 'contoured and terraced with crop residue', 'poor', null, 60, 71, 78, 81],
  ['2-2b', 'small grain', 'contoured and terraced with crop residue', 'good', null, 58, 69, 77, 80],
  ['2-2b', 'close-seeded legumes or rotation meadow', 'straight row', 'poor', null, 66, 77, 85, 89],
  ['2-2b', 'close-seeded legumes or rotation meadow', 'straight row', 'good', null, 58, 72, 81, 85],
  ['2-2b', 'close-seeded legumes or rotation meadow', 'contoured', 'poor', null, 64, 75, 83, 85],
  ['2-2b', 'close-seeded legumes or rotation meadow', 'contoured', 'good', null, 55, 69, 78, 83],
  ['2-2b', 'close-seeded legumes or rotation meadow', 'contoured and terraced', 'poor', null, 63, 73, 80, 83],
  ['2-2b', 'close-seeded legumes or rotation meadow', 'contoured and terraced', 'good', null, 51, 67, 76, 80],
  ['2-2c', 'pasture', null, 'poor', null, 68, 79, 86, 89],
  ['2-2c', 'pasture', null, 'fair', null, 49, 69, 79, 84],
  ['2-2c', 'pasture', null, 'good', null, 39, 61, 74, 80],
  ['2-2c', 'meadow', null, null, null, 30, 58, 71, 78],
  ['2-2c', 'brush', null, 'poor', null, 48, 67, 77, 83],
  ['2-2c', 'brush', null, 'fair', null, 35, 56, 70, 77],
  ['2-2c', 'brush', null, 'good', null, 30, 48, 65, 73],
  ['2-2c', 'orchard or tree farm', null, 'poor', null, 57, 73, 82, 86],
  ['2-2c', 'orchard or tree farm', null, 'fair', null, 43, 65, 76, 82],
  ['2-2c', 'orchard or tree farm', null, 'good', null, 32, 58, 72, 79],
  ['2-2c', 'woods', null, 'poor', null, 45, 66, 77, 83],
  ['2-2c', 'woods', null, 'fair', null, 36, 60, 73, 79],
  ['2-2c', 'woods', null, 'good', null, 30, 55, 70, 77],
  ['2-2c', 'farmsteads', null, null, null, 59, 74, 82, 86],
];

export const curveNumbers: readonly CurveNumberRow[] = rows.map(
  ([table, cover, treatment, condition, sealedPercent, A, B, C, D]) => ({
    class: [cover, treatment, condition].filter((part) => part !== null).join(', '),
    table,
    cover,
    treatment,
    condition,
    sealedPercent,
    numbers: { A, B, C, D },
  }),
);

/**
 * Curve numbers of average antecedent runoff, and what they become when all was dry (I) or wet (III) before: `[II, I, III]`.
 * Source: USDA-SCS (1985) National Engineering Handbook, Section 4, Table 10.1, every tenth row.
 */
export const antecedentRunoff: readonly (readonly [average: number, dry: number, wet: number])[] = [
  [30, 15, 50],
  [40, 22, 60],
  [50, 31, 70],
  [60, 40, 78],
  [70, 51, 85],
  [80, 63, 91],
  [90, 78, 96],
  [100, 100, 100],
];
