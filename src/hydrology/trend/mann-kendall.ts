import { normalTails } from '../distribution/normal-tails.ts';
import { computedTogether, type Statistic, undefinedBecause } from '../paired.ts';
import { repeats } from './repeats.ts';

export interface MannKendall {
  readonly n: number;
  /** Rises less falls among all pairs of values. */
  readonly s: number;
  readonly variance: number;
  readonly z: number;
  readonly p: number;
}

/**
 * Mann-Kendall test: whether a record rises or falls more often than chance would have it.
 *
 * Formula: S = sum of sgn(x_j - x_i) over i < j; Var = (n(n-1)(2n+5) - sum of t(t-1)(2t+5) over ties) / 18;
 * Z = (S -+ 1) / sqrt(Var), 0 if S = 0; p = 2 (1 - Phi(|Z|))
 * Inputs: values in order of time, one per year (same-date or annual means, never raw daily values).
 * Range: S -n(n-1)/2 to n(n-1)/2; p 0 to 1.
 * Read: positive S = rising. With fewer than 5 values p cannot fall under 0.05 whatever the trend, so that no trend is then no evidence. Persistence from year to year makes p too small.
 * Undefined: fewer than two values.
 * Variant: exact p for small n exists; the normal approximation is used as published tests do.
 * Source: Mann 1945, Econometrica 13:245-259; Kendall 1975, Rank Correlation Methods (both from memory).
 * Example: mannKendall([9, 8, 8, 6, 5, 3, 1]) -> {value: {n: 7, s: -20, variance: 43.3333, z: -2.8863, p: 0.0039}}
 */
export function mannKendall(values: ArrayLike<number>): Statistic<MannKendall> {
  const n = values.length;
  if (n < 2) return undefinedBecause('a trend needs at least two values');
  let s = 0;
  for (let i = 0; i < n; i++)
    for (let j = i + 1; j < n; j++) s += Math.sign((values[j] ?? 0) - (values[i] ?? 0));
  const weight = (count: number) => count * (count - 1) * (2 * count + 5);
  let numerator = weight(n);
  for (const count of repeats(values)) numerator -= weight(count);
  const variance = numerator / 18;
  const z = s === 0 ? 0 : (s - Math.sign(s)) / Math.sqrt(variance);
  return computedTogether({ n, s, variance, z, p: normalTails(z) });
}
