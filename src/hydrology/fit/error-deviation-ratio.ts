import { moments } from '../moments.ts';
import { computed, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { withoutVariation } from '../reasons.ts';

/**
 * RSR: root mean square error as a share of the standard deviation of the observations.
 *
 * Formula: sqrt(sum((O - S)^2)) / sqrt(sum((O - mean O)^2)), which is sqrt(1 - NSE)
 * Inputs: pairs in one unit, any.
 * Range: 0 upwards; best 0; 1 is as good as the observed mean.
 * Read: the same verdict as NSE on another scale; stating both adds nothing, and they must agree.
 * Undefined: fewer than two pairs, or observations all equal.
 * Variant: dividing by the deviation with n - 1 makes it sqrt((n - 1) / n) too small: `errorSampleDeviationRatio`.
 * Source: Moriasi et al. 2007, Trans. ASABE 50(3):885-900, eq. 3.
 * Example: errorDeviationRatio(pairInOrder({observed: [1, 2, 3, 6], simulated: [3, 3, 3, 3]})) -> {value: 1}
 */
export function errorDeviationRatio(paired: Paired): Statistic {
  const sums = moments(paired);
  const reason = withoutVariation(sums);
  if (reason) return undefinedBecause(reason);
  return computed(Math.sqrt(sums.errorSquares / sums.observedSquares));
}
