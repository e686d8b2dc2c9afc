import { moments } from '../moments.ts';
import { computed, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { noPairs } from '../reasons.ts';

/**
 * Root mean square error: the typical size of an error, large ones counting most.
 *
 * Formula: sqrt(mean((O - S)^2))
 * Inputs: pairs in one unit; the result is in that unit.
 * Range: 0 upwards; best 0.
 * Read: low when under half the standard deviation of the observations (Singh et al. 2004, in Moriasi et al. 2007).
 * Undefined: no pairs.
 * Source: definition; used in Moriasi et al. 2007, Trans. ASABE 50(3):885-900, eq. 3.
 * Example: rootMeanSquareError(pairInOrder({observed: [10, 20, 30, 40], simulated: [11, 22, 33, 44]})) -> {value: 2.7386}
 */
export function rootMeanSquareError(paired: Paired): Statistic {
  const sums = moments(paired);
  if (sums.pairs === 0) return undefinedBecause(noPairs);
  return computed(Math.sqrt(sums.errorSquares / sums.pairs));
}
