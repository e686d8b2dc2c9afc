import { isConstant } from '../arithmetic.ts';
import { defined, type Statistic, undefinedBecause } from '../paired.ts';
import { ranks } from './ranks.ts';

export interface ChangePoint {
  /** Largest |U|. */
  readonly k: number;
  /** U there: positive = the record falls. */
  readonly u: number;
  /** How many values come before the change. */
  readonly before: number;
  /** Time of the last value before the change and of the first after it. */
  readonly lastBefore: number;
  readonly firstAfter: number;
  readonly p: number;
}

/**
 * Pettitt test: where a record changes its level, and how doubtful that is.
 *
 * Formula: U_t = 2 (sum of the first t ranks) - t (n + 1); K = max |U_t|, the first t if several; p = 2 exp(-6 K^2 / (n^3 + n^2)), at most 1
 * Inputs: times and values step beside step, in order of time.
 * Range: K 0 to n^2/2; p 0 to 1, a good approximation up to 0.5.
 * Read: t is the last value of the old regime, so that the Nile's new one begins in 1899. A trend or persistence also makes p small.
 * Undefined: fewer than two values, or values all equal.
 * Source: Pettitt 1979, Appl. Stat. 28:126-135.
 * Example: pettitt({times: [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12], values: [4, 5, 3, 4, 6, 4, 9, 11, 8, 10, 9, 12]}) -> {value: {k: 36, u: -36, before: 6, lastBefore: 6, firstAfter: 7, p: 0.0314}}
 */
export function pettitt(of: {
  readonly times: ArrayLike<number>;
  readonly values: ArrayLike<number>;
}): Statistic<ChangePoint> {
  const n = of.values.length;
  if (n < 2) return undefinedBecause('a change needs at least two values');
  if (isConstant(of.values)) return undefinedBecause('the values are all equal, so nothing changes');
  const ranked = ranks(of.values);
  let sum = 0;
  let before = 0;
  let u = 0;
  for (let t = 1; t < n; t++) {
    sum += ranked[t - 1] ?? 0;
    const candidate = 2 * sum - t * (n + 1);
    if (Math.abs(candidate) > Math.abs(u)) [before, u] = [t, candidate];
  }
  const k = Math.abs(u);
  return defined({
    k,
    u,
    before,
    lastBefore: of.times[before - 1] ?? Number.NaN,
    firstAfter: of.times[before] ?? Number.NaN,
    p: Math.min(1, 2 * Math.exp((-6 * k * k) / (n ** 3 + n ** 2))),
  });
}
