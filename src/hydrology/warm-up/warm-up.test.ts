import { describe, expect, it } from 'vitest';
import { isDefined } from '../paired.ts';
import { mannKendall } from '../trend/mann-kendall.ts';
import { linearStoreDays } from './linear-store-days.ts';
import { settledYear } from './settled-year.ts';
import { storeDrift } from './store-drift.ts';

describe('warm-up', () => {
  it('a store of 120 days needs 553 days to forget all but 1 %', () => {
    // 120 ln 100 = 552.6
    expect(linearStoreDays({ storeConstantDays: 120, remainingShare: 0.01 })).toEqual({ value: 553 });
    expect(linearStoreDays({ storeConstantDays: 120, remainingShare: 1 })).toEqual({ value: 0 });
    expect(isDefined(linearStoreDays({ storeConstantDays: 0, remainingShare: 0.01 }))).toBe(false);
  });

  it('settles only when no later year moves', () => {
    expect(settledYear({ storage: [100, 100, 100], limitPercent: 1 })).toEqual({ value: 2 });
    expect(settledYear({ storage: [100, 100, 150, 150], limitPercent: 1 })).toEqual({ value: 4 });
    expect(isDefined(settledYear({ storage: [100, 100, 150], limitPercent: 1 }))).toBe(false);
    expect(isDefined(settledYear({ storage: [100], limitPercent: 1 }))).toBe(false);
    // A change of exactly the limit is not below it.
    expect(isDefined(settledYear({ storage: [100, 101], limitPercent: 1 }))).toBe(false);
    // An empty store has no relative change, so it has not settled.
    expect(settledYear({ storage: [0, 10, 10], limitPercent: 1 })).toEqual({ value: 3 });
  });

  it('four years that rise without exception cannot reach p < 0.05, five can', () => {
    // S = 6, Var = 8.667, Z = 1.698, p = 0.089; S = 10, Var = 16.667, Z = 2.205, p = 0.027
    const four = mannKendall([1, 2, 3, 4]);
    const five = mannKendall([1, 2, 3, 4, 5]);
    expect(isDefined(four) && four.value.p).toBeCloseTo(0.089, 3);
    expect(isDefined(five) && five.value.p).toBeCloseTo(0.0275, 4);
  });

  it('a drift of five years is tested, and shares need something to divide by', () => {
    const drift = storeDrift({
      years: [1, 2, 3, 4, 5],
      storageMm: [0, 8, 16, 24, 32],
      annualRainfallMm: 800,
    });
    expect(drift).toMatchObject({
      value: {
        slope: { slope: 8 },
        slopePercentOfRainfall: { value: 1 },
        trend: { value: { s: 10 } },
        largestChangePercent: { undefined: 'the store was empty the year before' },
        lastChangePercent: { value: 100 / 3 },
      },
    });
    expect(isDefined(storeDrift({ years: [1], storageMm: [5], annualRainfallMm: 800 }))).toBe(false);
  });
});
