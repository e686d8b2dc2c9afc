import { describe, expect, it } from 'vitest';
import { isDefined } from '../paired.ts';
import { type RatingRow, ratings, ratingTables } from '../tables/performance-ratings.ts';
import { lowestRating } from './lowest-rating.ts';
import { rateScore } from './rate-score.ts';
import { ratingBases, ratingBasis } from './rating-basis.ts';

/** Exact ends of every printed interval: what lies on a limit, just below and just above it. */
function rated(table: string, row: RatingRow, value: number): string {
  const [variable = '', step = 'monthly'] = [row.variables[0], row.steps[0]];
  const score = rateScore({ table, statistic: row.statistic, variable, step, scale: row.scale, value });
  return isDefined(score) ? score.value.rating : score.undefined;
}

describe('ends of the published intervals', () => {
  for (const { id, rows } of ratingTables)
    for (const row of rows)
      row.limits.forEach((limit, place) => {
        if (limit === null) return;
        const better = ratings[place];
        const worse = ratings[place + 1];
        it(`${id} ${row.statistic} ${row.variables.join(', ')} (${row.scale}) at ${limit}`, () => {
          const hair = 1e-9;
          if (row.reaches === '>') {
            expect(rated(id, row, limit + hair)).toBe(better);
            expect(rated(id, row, limit)).toBe(worse);
            expect(rated(id, row, limit - hair)).toBe(worse);
          } else if (row.reaches === '<=') {
            expect(rated(id, row, limit)).toBe(better);
            expect(rated(id, row, limit + hair)).toBe(worse);
          } else
            for (const sign of [1, -1]) {
              expect(rated(id, row, sign * (limit - hair))).toBe(better);
              expect(rated(id, row, sign * limit)).toBe(worse);
            }
        });
      });
});

/** The limits once more, typed from the articles' tables and abstracts and not from our data: very good, good, satisfactory. */
const printedLimits: [string, string, string, 'watershed' | 'field', string, (number | null)[]][] = [
  // Moriasi et al. 2007, Trans. ASABE 50(3):885-900, Table 4
  ['moriasi-2007', 'RSR', 'streamflow sediment nitrogen phosphorus', 'watershed', '<=', [0.5, 0.6, 0.7]],
  ['moriasi-2007', 'NSE', 'streamflow sediment nitrogen phosphorus', 'watershed', '>', [0.75, 0.65, 0.5]],
  ['moriasi-2007', 'PBIAS', 'streamflow', 'watershed', '|x| <', [10, 15, 25]],
  ['moriasi-2007', 'PBIAS', 'sediment', 'watershed', '|x| <', [15, 30, 55]],
  ['moriasi-2007', 'PBIAS', 'nitrogen phosphorus', 'watershed', '|x| <', [25, 40, 70]],
  // Moriasi et al. 2015, Trans. ASABE 58(6):1763-1785; sediment and nutrients above satisfactory from memory
  ['moriasi-2015', 'R2', 'streamflow', 'watershed', '>', [0.85, 0.75, 0.6]],
  ['moriasi-2015', 'R2', 'sediment phosphorus', 'watershed', '>', [0.8, 0.65, 0.4]],
  ['moriasi-2015', 'R2', 'nitrogen', 'watershed', '>', [0.7, 0.6, 0.3]],
  ['moriasi-2015', 'NSE', 'streamflow', 'watershed', '>', [0.8, 0.7, 0.5]],
  ['moriasi-2015', 'NSE', 'sediment', 'watershed', '>', [0.8, 0.7, 0.45]],
  ['moriasi-2015', 'NSE', 'nitrogen phosphorus', 'watershed', '>', [0.65, 0.5, 0.35]],
  ['moriasi-2015', 'PBIAS', 'streamflow', 'watershed', '|x| <', [5, 10, 15]],
  ['moriasi-2015', 'PBIAS', 'sediment', 'watershed', '|x| <', [10, 15, 20]],
  ['moriasi-2015', 'PBIAS', 'nitrogen phosphorus', 'watershed', '|x| <', [15, 20, 30]],
  ['moriasi-2015', 'R2', 'streamflow', 'field', '>', [0.85, 0.75, 0.7]],
  ['moriasi-2015', 'd', 'streamflow', 'field', '>', [0.9, 0.85, 0.75]],
  // Abstract of the 2025 article on fine time scales: satisfactory only
  ['fine-scale-2025', 'NSE', 'sediment', 'watershed', '>', [null, null, 0.45]],
  ['fine-scale-2025', 'NSE', 'total nutrient', 'watershed', '>', [null, null, 0.3]],
  ['fine-scale-2025', 'NSE', 'dissolved nutrient', 'watershed', '>', [null, null, 0.35]],
];

it('every row of the tables is as printed', () => {
  const ours = ratingTables.flatMap(({ id, rows }) =>
    rows.map(({ statistic, variables, scale, reaches, limits }) => [
      id,
      statistic,
      variables.join(' '),
      scale,
      reaches,
      [...limits],
    ]),
  );
  expect(ours).toEqual(printedLimits);
});

const flow = { table: 'moriasi-2007', variable: 'streamflow', step: 'monthly', scale: 'watershed' } as const;

describe('rating a score', () => {
  it('says where the article contradicts itself, and follows the table', () => {
    const at = rateScore({ ...flow, statistic: 'RSR', value: 0.7 });
    expect(at).toMatchObject({
      value: { rating: 'satisfactory', disputed: expect.stringContaining('abstract') },
    });
    const beside = rateScore({ ...flow, statistic: 'RSR', value: 0.69 });
    expect(beside).toMatchObject({ value: { disputed: null } });
    const bias = rateScore({ ...flow, table: 'moriasi-2015', statistic: 'PBIAS', value: -15 });
    expect(bias).toMatchObject({
      value: { rating: 'unsatisfactory', disputed: expect.stringContaining('15 %') },
    });
  });

  it('never rounds: 0.4999 is not 0.50, and 0.5001 passes', () => {
    expect(rateScore({ ...flow, statistic: 'NSE', value: 0.4999 })).toMatchObject({
      value: { rating: 'unsatisfactory' },
    });
    expect(rateScore({ ...flow, statistic: 'NSE', value: 0.5001 })).toMatchObject({
      value: { rating: 'satisfactory' },
    });
  });

  it.each([
    [{ ...flow, statistic: 'NSE', value: 1.01 }, 'NSE cannot be 1.01'],
    [{ ...flow, statistic: 'RSR', value: -0.1 }, 'RSR cannot be -0.1'],
    [{ ...flow, table: 'moriasi-2015', statistic: 'R2', value: -0.1 }, 'R2 cannot be -0.1'],
    [{ ...flow, statistic: 'NSE', value: Number.NaN }, 'NSE cannot be NaN'],
    [
      { ...flow, step: 'daily', statistic: 'NSE', value: 0.8 },
      'moriasi-2007 publishes no daily NSE limits for streamflow',
    ],
    [
      { ...flow, table: 'nobody-1900', statistic: 'NSE', value: 0.8 },
      'no rating table is called nobody-1900',
    ],
  ] as const)('has none for %j', (of, reason) => expect(rateScore(of)).toEqual({ undefined: reason }));

  it('lets the lowest class govern', () => {
    expect(lowestRating(['very good', 'unsatisfactory', 'good'])).toEqual({ value: 'unsatisfactory' });
    expect(lowestRating([])).toEqual({ undefined: 'no score was rated' });
  });

  it('every name leads to a row that rates, and holds its time step', () => {
    expect(ratingBases.size).toBeGreaterThan(12);
    for (const [name, basis] of ratingBases) {
      expect(name).toContain(basis.step);
      expect(ratingBasis(name)).toEqual({ value: basis });
      const anyStatistic = ['NSE', 'PBIAS', 'R2', 'RSR', 'd'] as const;
      const found = anyStatistic.map((statistic) =>
        rateScore({ ...basis, statistic, scale: 'watershed', value: 0.9 }),
      );
      expect(found.some(isDefined), name).toBe(true);
    }
    expect(isDefined(ratingBasis('moriasi-2007-daily-flow'))).toBe(false);
  });
});
