/** Classes of a rating, best first. Both articles' lowest class is meant by `unsatisfactory`; that of 2015 calls it not satisfactory. */
export const ratings = ['very good', 'good', 'satisfactory', 'unsatisfactory'] as const;
export type Rating = (typeof ratings)[number];

export type RatedStatistic = 'NSE' | 'RSR' | 'PBIAS' | 'R2' | 'd';
export type RatedStep = 'daily' | 'monthly' | 'annual';

/**
 * How a value reaches a class: by being above its limit (`>`), not above it (`<=`), or nearer to zero than it (`|x| <`).
 * So the exact limit belongs to the worse class for `>` and `|x| <`, to the better one for `<=`.
 */
export type Reaches = '>' | '<=' | '|x| <';

export interface RatingRow {
  readonly statistic: RatedStatistic;
  readonly variables: readonly string[];
  readonly steps: readonly RatedStep[];
  readonly scale: 'watershed' | 'field';
  readonly reaches: Reaches;
  /** Limits of very good, good and satisfactory; two nulls where only satisfactory is published. PBIAS in percent. */
  readonly limits: readonly [number | null, number | null, number];
  /** What was read in print and what is from memory. */
  readonly status: string;
  /** Where the article contradicts itself on a value that equals a limit. */
  readonly disputed?: { readonly at: number; readonly because: string };
}

export interface RatingTable {
  readonly id: string;
  readonly source: string;
  readonly rows: readonly RatingRow[];
}

const inTable4 = 'Table 4, every limit read in the article';
const allSteps = ['daily', 'monthly', 'annual'] as const;
const satisfactoryOnly = 'limit of satisfactory read in the abstract; the two above it from memory';
const flowOf2015 = 'all limits read in two copies of the table, satisfactory also in the abstract';
const closedIn2015 = (at: number) => ({
  at,
  because: `the abstract of the article counts exactly ${at} % as satisfactory, its table does not; the table is followed`,
});

export const ratingTables: readonly RatingTable[] = [
  {
    id: 'moriasi-2007',
    source:
      'Moriasi, Arnold, Van Liew, Bingner, Harmel & Veith 2007, Trans. ASABE 50(3):885-900, Table 4 (monthly values)',
    rows: [
      {
        statistic: 'RSR',
        variables: ['streamflow', 'sediment', 'nitrogen', 'phosphorus'],
        steps: ['monthly'],
        scale: 'watershed',
        reaches: '<=',
        limits: [0.5, 0.6, 0.7],
        status: inTable4,
        disputed: {
          at: 0.7,
          because:
            'the abstract of the article asks for RSR below 0.70, its Table 4 lets 0.70 pass; the table is followed',
        },
      },
      {
        statistic: 'NSE',
        variables: ['streamflow', 'sediment', 'nitrogen', 'phosphorus'],
        steps: ['monthly'],
        scale: 'watershed',
        reaches: '>',
        limits: [0.75, 0.65, 0.5],
        status: inTable4,
      },
      {
        statistic: 'PBIAS',
        variables: ['streamflow'],
        steps: ['monthly'],
        scale: 'watershed',
        reaches: '|x| <',
        limits: [10, 15, 25],
        status: inTable4,
      },
      {
        statistic: 'PBIAS',
        variables: ['sediment'],
        steps: ['monthly'],
        scale: 'watershed',
        reaches: '|x| <',
        limits: [15, 30, 55],
        status: inTable4,
      },
      {
        statistic: 'PBIAS',
        variables: ['nitrogen', 'phosphorus'],
        steps: ['monthly'],
        scale: 'watershed',
        reaches: '|x| <',
        limits: [25, 40, 70],
        status: inTable4,
      },
    ],
  },
  {
    id: 'moriasi-2015',
    source:
      'Moriasi, Gitau, Pai & Daggupati 2015, Trans. ASABE 58(6):1763-1785, final table of criteria, doi:10.13031/trans.58.10715',
    rows: [
      {
        statistic: 'R2',
        variables: ['streamflow'],
        steps: allSteps,
        scale: 'watershed',
        reaches: '>',
        limits: [0.85, 0.75, 0.6],
        status: flowOf2015,
      },
      {
        statistic: 'R2',
        variables: ['sediment', 'phosphorus'],
        steps: ['monthly'],
        scale: 'watershed',
        reaches: '>',
        limits: [0.8, 0.65, 0.4],
        status: satisfactoryOnly,
      },
      {
        statistic: 'R2',
        variables: ['nitrogen'],
        steps: ['monthly'],
        scale: 'watershed',
        reaches: '>',
        limits: [0.7, 0.6, 0.3],
        status: satisfactoryOnly,
      },
      {
        statistic: 'NSE',
        variables: ['streamflow'],
        steps: allSteps,
        scale: 'watershed',
        reaches: '>',
        limits: [0.8, 0.7, 0.5],
        status: flowOf2015,
      },
      {
        statistic: 'NSE',
        variables: ['sediment'],
        steps: ['monthly'],
        scale: 'watershed',
        reaches: '>',
        limits: [0.8, 0.7, 0.45],
        status: satisfactoryOnly,
      },
      {
        statistic: 'NSE',
        variables: ['nitrogen', 'phosphorus'],
        steps: ['monthly'],
        scale: 'watershed',
        reaches: '>',
        limits: [0.65, 0.5, 0.35],
        status: satisfactoryOnly,
      },
      {
        statistic: 'PBIAS',
        variables: ['streamflow'],
        steps: allSteps,
        scale: 'watershed',
        reaches: '|x| <',
        limits: [5, 10, 15],
        status: flowOf2015,
        disputed: closedIn2015(15),
      },
      {
        statistic: 'PBIAS',
        variables: ['sediment'],
        steps: allSteps,
        scale: 'watershed',
        reaches: '|x| <',
        limits: [10, 15, 20],
        status: satisfactoryOnly,
        disputed: closedIn2015(20),
      },
      {
        statistic: 'PBIAS',
        variables: ['nitrogen', 'phosphorus'],
        steps: allSteps,
        scale: 'watershed',
        reaches: '|x| <',
        limits: [15, 20, 30],
        status: satisfactoryOnly,
        disputed: closedIn2015(30),
      },
      {
        statistic: 'R2',
        variables: ['streamflow'],
        steps: ['monthly'],
        scale: 'field',
        reaches: '>',
        limits: [0.85, 0.75, 0.7],
        status: satisfactoryOnly,
      },
      {
        statistic: 'd',
        variables: ['streamflow'],
        steps: ['monthly'],
        scale: 'field',
        reaches: '>',
        limits: [0.9, 0.85, 0.75],
        status: satisfactoryOnly,
      },
    ],
  },
  {
    id: 'fine-scale-2025',
    source:
      'Establishing performance criteria for evaluating watershed-scale sediment and nutrient models at fine temporal scales, 2025 (abstract; Virginia Tech repository item 6993d042-f67d-4e59-bdf8-d862d4b933d4)',
    rows: [
      {
        statistic: 'NSE',
        variables: ['sediment'],
        steps: ['daily'],
        scale: 'watershed',
        reaches: '>',
        limits: [null, null, 0.45],
        status: 'read in the abstract',
      },
      {
        statistic: 'NSE',
        variables: ['total nutrient'],
        steps: ['daily'],
        scale: 'watershed',
        reaches: '>',
        limits: [null, null, 0.3],
        status: 'read in the abstract',
      },
      {
        statistic: 'NSE',
        variables: ['dissolved nutrient'],
        steps: ['daily'],
        scale: 'watershed',
        reaches: '>',
        limits: [null, null, 0.35],
        status: 'read in the abstract',
      },
    ],
  },
];
