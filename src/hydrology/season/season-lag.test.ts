import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isDefined, pairInOrder } from '../paired.ts';
import { climatology } from './climatology.ts';
import { seasonLag } from './season-lag.ts';
import { seasonPhase } from './season-phase.ts';

/** An invented leaf-area climatology: one season, steeper in spring than in autumn. */
const leaves = [0.6, 0.7, 1.1, 2.0, 3.4, 4.6, 5.0, 4.3, 2.9, 1.7, 0.9, 0.5];
const turned = (months: number) => leaves.map((_, month) => leaves[(month - months + 24) % 12] ?? 0);

describe('lag of the season', () => {
  it('is what the season was turned by, late positive, whatever its scale', () =>
    fc.assert(
      fc.property(
        fc.integer({ min: -5, max: 6 }),
        fc.double({ min: 0.1, max: 9, noNaN: true }),
        (months, scale) => {
          const simulated = turned(months).map((value) => 3 + scale * value);
          const lag = seasonLag(pairInOrder({ observed: leaves, simulated }));
          expect(isDefined(lag) && lag.value.months).toBe(months);
          const phase =
            isDefined(lag) && isDefined(lag.value.phaseMonths) ? lag.value.phaseMonths.value : Number.NaN;
          // Six months late and six months early are one phase.
          expect(
            Math.min(Math.abs(phase - months), Math.abs(Math.abs(phase) - 6 + Math.abs(months) - 6)),
          ).toBeLessThan(1e-6);
        },
      ),
    ));

  it('takes the smaller, then the later of two equal lags', () => {
    // Two equal seasons half a year apart fit at 0 and 6; the wave of four months also at 4 and -4.
    const wave = (period: number) =>
      Array.from({ length: 12 }, (_, month) => Math.cos((2 * Math.PI * month) / period));
    const lagOf = (period: number, shift: number) => {
      const waves = wave(period);
      const simulated = waves.map((_, month) => waves[(month - shift + 24) % 12] ?? 0);
      const lag = seasonLag(pairInOrder({ observed: waves, simulated }));
      return isDefined(lag) ? lag.value.months : null;
    };
    expect(lagOf(6, 0)).toBe(0);
    expect(lagOf(4, 2)).toBe(2);
    expect(lagOf(6, 3)).toBe(3);
  });

  it('has a reason where there is no season to compare', () => {
    const flat = leaves.map(() => 2);
    expect(isDefined(seasonLag(pairInOrder({ observed: flat, simulated: leaves })))).toBe(false);
    expect(isDefined(seasonLag(pairInOrder({ observed: leaves, simulated: flat })))).toBe(false);
    expect(isDefined(seasonLag(pairInOrder({ observed: [1, 2], simulated: [2, 1] })))).toBe(false);
    expect(isDefined(seasonPhase(flat))).toBe(false);
    const twice = Array.from(
      { length: 12 },
      (_, month) => Math.cos((Math.PI * month) / 3) + 0.1 * (month % 12),
    );
    expect(seasonPhase(twice)).toMatchObject({ undefined: expect.stringContaining('two seasons') });
  });

  it('a climatology is the mean of each calendar month, leap years and all', () => {
    const months = Array.from({ length: 36 }, (_, index) => Date.UTC(2011, index, 1) / 86_400_000);
    const values = months.map((_, index) => (index % 12) + Math.floor(index / 12));
    const paired = {
      ...pairInOrder({ observed: values, simulated: values }),
      times: Float64Array.from(months),
    };
    const twelve = climatology(paired);
    // (m + m + 1 + m + 2) / 3 = m + 1
    expect(isDefined(twelve) && Array.from(twelve.value.observed)).toEqual([
      1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12,
    ]);
  });
});
