import { mean } from '../arithmetic.ts';
import { computed, type Statistic, undefinedBecause } from '../paired.ts';
import type { Band } from './band.ts';
import { withoutBand } from './crossed-steps.ts';

/**
 * Interval score: width and misses of a band in one figure.
 *
 * Formula: mean of (u - l) + (2 / a) (l - x) where x < l + (2 / a) (x - u) where x > u, a = 1 - level
 * Inputs: a band, one unit; its level, such as 0.95; the result is in the unit of the band.
 * Range: 0 upwards; smaller is better.
 * Read: compares bands of one level over one window; neither an endless nor a thin band can win.
 * Undefined: no steps, a band that is upside down anywhere, a level not between 0 and 1.
 * Variant: some code multiplies by a / 2, which is 40 times smaller at 0.95.
 * Source: Gneiting & Raftery 2007, J. Am. Stat. Assoc. 102:359-378, eq. 43.
 * Example: intervalScore({band: bandInOrder({observed: [1, 4], lower: [0, 1], upper: [2, 3]}), level: 0.95}) -> {value: 22}
 */
export function intervalScore(of: { readonly band: Band; readonly level: number }): Statistic {
  const reason = withoutBand(of.band);
  if (reason) return undefinedBecause(reason);
  if (!(of.level > 0 && of.level < 1)) return undefinedBecause('the level of a band lies between 0 and 1');
  const penalty = 2 / (1 - of.level);
  const scores = of.band.observed.map((value, step) => {
    const lower = of.band.lower[step] ?? Number.NaN;
    const upper = of.band.upper[step] ?? Number.NaN;
    return upper - lower + penalty * (Math.max(0, lower - value) + Math.max(0, value - upper));
  });
  return computed(mean(scores));
}
