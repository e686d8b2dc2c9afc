import { mean } from '../arithmetic.ts';
import { computed, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { noPairs } from '../reasons.ts';

/**
 * Mean absolute error: the average size of an error, all errors counting alike.
 *
 * Formula: mean(|O - S|)
 * Inputs: pairs in one unit; the result is in that unit.
 * Range: 0 upwards; best 0; never above the root mean square error.
 * Read: far below the root mean square error when few large errors make up most of it.
 * Undefined: no pairs.
 * Source: definition; Moriasi et al. 2007, Trans. ASABE 50(3):885-900, error indices.
 * Example: meanAbsoluteError(pairInOrder({observed: [10, 20, 30, 40], simulated: [11, 22, 33, 44]})) -> {value: 2.5}
 */
export function meanAbsoluteError(paired: Paired): Statistic {
  const { observed, simulated } = paired;
  if (observed.length === 0) return undefinedBecause(noPairs);
  return computed(mean(observed.map((value, index) => Math.abs(value - (simulated[index] ?? 0)))));
}
