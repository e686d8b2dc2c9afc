import { computed, type Statistic, undefinedBecause } from '../paired.ts';
import { repeats } from './repeats.ts';

/**
 * Kendall's tau-b of a record against time: rises less falls, as a share of the pairs that could differ.
 *
 * Formula: S / sqrt((n(n-1)/2 - ties in time) (n(n-1)/2 - ties in value))
 * Inputs: times and values, step beside step.
 * Range: -1 to 1; 0 without trend.
 * Read: the strength of a trend where Mann-Kendall gives its doubt.
 * Undefined: fewer than two values; times or values all equal.
 * Source: Kendall 1975, Rank Correlation Methods (from memory).
 * Example: kendallTau({times: [1, 2, 3, 4], values: [2, 1, 3, 4]}) -> {value: 0.6667}
 */
export function kendallTau(of: {
  readonly times: ArrayLike<number>;
  readonly values: ArrayLike<number>;
}): Statistic {
  const n = of.values.length;
  let s = 0;
  for (let i = 0; i < n; i++)
    for (let j = i + 1; j < n; j++)
      s +=
        Math.sign((of.values[j] ?? 0) - (of.values[i] ?? 0)) *
        Math.sign((of.times[j] ?? 0) - (of.times[i] ?? 0));
  const differing = (side: ArrayLike<number>) =>
    repeats(side).reduce((pairs, count) => pairs - (count * (count - 1)) / 2, (n * (n - 1)) / 2);
  const scale = Math.sqrt(differing(of.times) * differing(of.values));
  return scale === 0 ? undefinedBecause('all values or all times are equal') : computed(s / scale);
}
