import { describe, expect, it } from 'vitest';
import { isDefined, pairInOrder } from '../paired.ts';
import { rainfallRecords } from '../tables/rainfall-records.ts';
import { dayShift } from './day-shift.ts';
import { doubleMass } from './double-mass.ts';
import { longestDrySpells } from './longest-dry-spells.ts';
import { monthlyAnomalyCorrelation } from './monthly-anomaly-correlation.ts';
import { rainfallBound } from './rainfall-bound.ts';
import { stuckRuns } from './stuck-runs.ts';
import { depthFactors, unitFactor, unitFactors } from './unit-factor.ts';

/** Invented rain: storms of two to four days and dry days between. */
const rain = Array.from({ length: 400 }, (_, day) =>
  (day * 7919) % 13 < 4 ? ((day * day * 31) % 97) / 3 : 0,
);

describe('a series shifted by a day', () => {
  it('is told late from early', () => {
    const late = pairInOrder({ observed: rain.slice(1), simulated: rain.slice(0, -1) });
    expect(dayShift(late)).toMatchObject({ value: { days: 1, oneDayLate: 1 } });
    const early = pairInOrder({ observed: rain.slice(0, -1), simulated: rain.slice(1) });
    expect(dayShift(early)).toMatchObject({ value: { days: -1, oneDayEarly: 1 } });
  });

  it('stays where it is when the same day fits best', () => {
    expect(dayShift(pairInOrder({ observed: rain, simulated: rain.map((mm) => 0.8 * mm) }))).toMatchObject({
      value: { days: 0, gain: 0 },
    });
  });

  it('never compares across a gap', () => {
    // Every second day missing: no day has its neighbour.
    const sparse = rain.map((mm, day) => (day % 2 ? null : mm));
    expect(isDefined(dayShift(pairInOrder({ observed: sparse, simulated: rain })))).toBe(false);
  });
});

describe('units mistaken', () => {
  it.each(unitFactors.map(({ factor }) => factor))('factor %d, either way round', (factor) => {
    const tooLarge = unitFactor({ total: 900 * factor, referenceTotal: 1000, toleranceShare: 0.2 });
    expect(tooLarge).toMatchObject({ value: { near: { factor }, tooLarge: true } });
    const tooSmall = unitFactor({ total: 1100, referenceTotal: 1000 * factor, toleranceShare: 0.2 });
    expect(tooSmall).toMatchObject({ value: { near: { factor }, tooLarge: false } });
  });

  it('a wet or dry series is not a unit', () => {
    for (const total of [500, 900, 1000, 1500, 4000])
      expect(unitFactor({ total, referenceTotal: 1000, toleranceShare: 0.2 })).toMatchObject({
        value: { near: null },
      });
    expect(isDefined(unitFactor({ total: 0, referenceTotal: 1000, toleranceShare: 0.2 }))).toBe(false);
  });

  it('of rain, never between volumes', () => {
    // A gauge in inches that has a quarter more rain than its neighbour: 1.25 * 25.4 = 31.75, nearer to 35.3.
    const totals = { total: 31_750, referenceTotal: 1000, toleranceShare: 0.35 };
    expect(unitFactor(totals)).toMatchObject({ value: { near: { factor: 35.3147 } } });
    expect(unitFactor({ ...totals, among: depthFactors })).toMatchObject({
      value: { near: { factor: 25.4 } },
    });
  });
});

describe('runs of equal values', () => {
  it('end at a missing value, and at the end of the series', () => {
    const values = [2, 2, null, 2, Number.NaN, 5, 5, 5];
    expect(stuckRuns({ values, minimumLength: 2, of: 'non-zero' })).toEqual([
      { first: 0, last: 1, length: 2, value: 2 },
      { first: 5, last: 7, length: 3, value: 5 },
    ]);
  });

  it('zeros are asked for apart', () => {
    expect(stuckRuns({ values: [0, 0, 0, 4, 4], minimumLength: 2, of: 'zero' })).toEqual([
      { first: 0, last: 2, length: 3, value: 0 },
    ]);
    expect(isDefined(longestDrySpells([0, 0, 1]))).toBe(false);
  });
});

describe('bounds of rainfall', () => {
  it('the records rise with their duration', () => {
    for (const [index, record] of rainfallRecords.entries()) {
      const before = rainfallRecords[index - 1];
      if (!before) continue;
      expect(record.hours).toBeGreaterThan(before.hours);
      expect(record.mm).toBeGreaterThan(before.mm);
    }
  });

  it.each([
    [24, 1825], // WMO World Weather and Climate Extremes Archive
    [48, 2493], // WMO press release 988
    [366 * 24, 26_470], // WMO press release 988
    [3, 1144], // between two records the longer one bounds
  ])('%d hours: %d mm', (hours, mm) => expect(rainfallBound(hours)).toMatchObject({ value: { mm } }));

  it('ends at twelve months', () => {
    expect(isDefined(rainfallBound(400 * 24))).toBe(false);
    expect(isDefined(rainfallBound(0))).toBe(false);
  });
});

describe('comparison with a reference', () => {
  it('a straight double-mass line has no break', () => {
    const [years, pattern] = [
      [1, 2, 3, 4],
      [800, 1000, 900, 1200],
    ];
    expect(isDefined(doubleMass({ years, pattern, station: pattern.map((mm) => mm / 2) }))).toBe(false);
    expect(isDefined(doubleMass({ years, pattern: [800, 0, 900, 1200], station: pattern }))).toBe(false);
  });

  it('one year has no anomalies', () => {
    const days = Array.from({ length: 12 }, (_, month) => Date.UTC(2001, month, 1) / 86_400_000);
    const year = pairInOrder({ observed: days, simulated: days.map((_, month) => month) });
    const reason = { undefined: 'one year has no anomalies: each month is its own mean' };
    expect(monthlyAnomalyCorrelation({ ...year, times: Float64Array.from(days) })).toEqual(reason);
  });
});
