import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { kolmogorovSmirnov } from './distribution/kolmogorov-smirnov.ts';
import { quantile } from './distribution/quantile.ts';
import { isDefined, pairInOrder, type Statistic } from './paired.ts';
import { peakHits } from './peaks/peak-hits.ts';
import { mannKendall } from './trend/mann-kendall.ts';
import { pettitt } from './trend/pettitt.ts';
import { senSlope } from './trend/sen-slope.ts';

/** Laws that hold for every record, from the definitions alone; no expected number is needed. */
const flow = fc.integer({ min: 1, max: 1_000_000 }).map((thousandths) => thousandths / 1000);
const pairsOf = (least: number) =>
  fc
    .array(fc.tuple(flow, flow), { minLength: least, maxLength: 60 })
    .map((rows) => pairInOrder({ observed: rows.map(([o]) => o), simulated: rows.map(([, s]) => s) }));

function value(statistic: Statistic): number {
  return isDefined(statistic) ? statistic.value : Number.NaN;
}

function near(actual: number, wanted: number): void {
  expect(Math.abs(actual - wanted)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(wanted)));
}

describe('laws of the other statistics', () => {
  const series = fc.array(flow, { minLength: 3, maxLength: 40 });
  const times = (values: readonly number[]) => values.map((_, index) => index);

  it('a record turned round has the opposite trend and the mirrored change', () =>
    fc.assert(
      fc.property(series, (values) => {
        const turned = values.toReversed();
        const [one, other] = [mannKendall(values), mannKendall(turned)];
        if (isDefined(one) && isDefined(other)) {
          expect(other.value.s).toBe(0 - one.value.s);
          near(other.value.p, one.value.p);
        }
        const [slope, back] = [
          senSlope({ times: times(values), values }),
          senSlope({ times: times(turned), values: turned }),
        ];
        if (isDefined(slope) && isDefined(back)) near(back.value.slope, -slope.value.slope);
        const [change, mirrored] = [
          pettitt({ times: times(values), values }),
          pettitt({ times: times(turned), values: turned }),
        ];
        if (isDefined(change) && isDefined(mirrored)) expect(mirrored.value.k).toBe(change.value.k);
      }),
    ));

  it('a straight line has its own slope', () =>
    fc.assert(
      fc.property(fc.integer({ min: -50, max: 50 }), fc.integer({ min: 2, max: 30 }), (gradient, n) => {
        const values = Array.from({ length: n }, (_, year) => 7 + gradient * year);
        const line = senSlope({ times: times(values), values });
        expect(isDefined(line) && line.value.slope).toBe(gradient);
        expect(isDefined(line) && line.value.intercept).toBe(7);
      }),
    ));

  it('a quantile lies between the extremes and rises with its probability', () =>
    fc.assert(
      fc.property(
        series,
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (values, a, b) => {
          for (const type of [6, 7] as const) {
            const [low, high] = [Math.min(a, b), Math.max(a, b)].map((probability) =>
              value(quantile({ values, probability, type })),
            );
            expect(low ?? Number.NaN).toBeLessThanOrEqual((high ?? Number.NaN) + 1e-9);
            expect(low ?? Number.NaN).toBeGreaterThanOrEqual(Math.min(...values));
          }
        },
      ),
    ));

  it('two samples have one distance, either way round, 0 for the same values', () =>
    fc.assert(
      fc.property(series, series, (sample, other) => {
        const [one, swapped] = [
          kolmogorovSmirnov({ sample, other }),
          kolmogorovSmirnov({ sample: other, other: sample }),
        ];
        if (isDefined(one) && isDefined(swapped)) near(swapped.value.distance, one.value.distance);
        const same = kolmogorovSmirnov({ sample, other: sample });
        expect(isDefined(same) && same.value.distance).toBe(0);
        expect(isDefined(same) && same.value.pLimit).toBe(1);
      }),
    ));

  it('peaks: hits and misses make up the observed, hits and false alarms the simulated, no peak is used twice', () =>
    fc.assert(
      fc.property(
        pairsOf(3),
        fc.integer({ min: 1, max: 5 }),
        fc.integer({ min: 0, max: 4 }),
        (paired, apart, tolerance) => {
          const found = peakHits({
            paired,
            threshold: 300,
            minimumDistanceDays: apart,
            toleranceDays: tolerance,
          });
          if (!isDefined(found)) return;
          const { hits, misses, falseAlarms, observedPeaks, simulatedPeaks } = found.value;
          expect(hits.length + misses).toBe(observedPeaks.length);
          expect(hits.length + falseAlarms).toBe(simulatedPeaks.length);
          expect(new Set(hits.map((hit) => hit.simulated)).size).toBe(hits.length);
          for (const hit of hits)
            expect(Math.abs(hit.observed - hit.simulated)).toBeLessThanOrEqual(tolerance);
          for (let i = 1; i < observedPeaks.length; i++)
            expect((observedPeaks[i] ?? 0) - (observedPeaks[i - 1] ?? 0)).toBeGreaterThanOrEqual(apart);
        },
      ),
    ));
});
