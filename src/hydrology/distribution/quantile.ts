import { ascending } from '../arithmetic.ts';
import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * Quantile: the value that a given share of the values stays below.
 *
 * Formula: linear between order statistics at position p (n + 1), held within 1 to n (type 6), or 1 + p (n - 1) (type 7)
 * Inputs: values in one unit, in any order; probability from 0 to 1; the result is in the unit of the values.
 * Range: smallest to largest value.
 * Read: type 6 is the plotting position i / (n + 1) of flow-duration curves; type 7 is the default of most libraries.
 * Undefined: no values, or a probability outside 0 to 1.
 * Source: Hyndman & Fan 1996, Am. Stat. 50(4):361-365, definitions 6 and 7 (from memory).
 * Example: quantile({values: [3.1, 0, 8.4, 2.2, 2.2, 19.5, 5], probability: 0.9, type: 7}) -> {value: 12.84}
 */
export function quantile(of: {
  readonly values: ArrayLike<number>;
  readonly probability: number;
  readonly type: 6 | 7;
}): Statistic {
  const { values, probability, type } = of;
  const count = values.length;
  if (count === 0) return undefinedBecause('there are no values to rank');
  if (!(probability >= 0 && probability <= 1)) return undefinedBecause('a probability lies between 0 and 1');
  const position = type === 6 ? probability * (count + 1) : 1 + probability * (count - 1);
  const held = Math.max(1, Math.min(count, position));
  const sorted = ascending(values);
  const lower = sorted[Math.floor(held) - 1] ?? Number.NaN;
  const upper = sorted[Math.ceil(held) - 1] ?? Number.NaN;
  return computed(lower + (held - Math.floor(held)) * (upper - lower));
}
