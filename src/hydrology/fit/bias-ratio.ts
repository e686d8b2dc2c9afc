import { total } from '../arithmetic.ts';
import { moments } from '../moments.ts';
import { computed, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { withoutSum } from '../reasons.ts';

/**
 * Bias ratio (beta): simulated mean over observed mean.
 *
 * Formula: mean(S) / mean(O), which is 1 - PBIAS / 100
 * Inputs: pairs in one unit, any.
 * Range: any; best 1.
 * Read: above 1 the model gives too much water.
 * Undefined: no pairs, or observations that sum to zero.
 * Source: Gupta, Kling, Yilmaz & Martinez 2009, J. Hydrol. 377:80-91.
 * Example: biasRatio(pairInOrder({observed: [10, 20, 30, 40], simulated: [11, 22, 33, 44]})) -> {value: 1.1}
 */
export function biasRatio(paired: Paired): Statistic {
  const reason = withoutSum(moments(paired));
  if (reason) return undefinedBecause(reason);
  return computed(total(paired.simulated) / total(paired.observed));
}
