import { moments } from '../moments.ts';
import { computed, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { withoutVariation } from '../reasons.ts';

/**
 * Variability ratio (alpha): standard deviation of the simulation over that of the observations.
 *
 * Formula: sd(S) / sd(O); dividing by n or n - 1 makes no difference while both use the same
 * Inputs: pairs in one unit, any.
 * Range: 0 upwards; best 1.
 * Read: under 1 the simulation is too smooth; a least-squares calibration pushes it there.
 * Undefined: fewer than two pairs, or observations all equal.
 * Source: Gupta, Kling, Yilmaz & Martinez 2009, J. Hydrol. 377:80-91.
 * Example: variabilityRatio(pairInOrder({observed: [10, 20, 30, 40], simulated: [11, 22, 33, 44]})) -> {value: 1.1}
 */
export function variabilityRatio(paired: Paired): Statistic {
  const sums = moments(paired);
  const reason = withoutVariation(sums);
  if (reason) return undefinedBecause(reason);
  return computed(Math.sqrt(sums.simulatedSquares) / Math.sqrt(sums.observedSquares));
}
