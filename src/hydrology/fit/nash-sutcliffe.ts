import { moments } from '../moments.ts';
import { computed, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { withoutVariation } from '../reasons.ts';

/**
 * Nash-Sutcliffe efficiency (NSE): how much closer the simulation is to the observations than their own mean is.
 *
 * Formula: 1 - sum((O - S)^2) / sum((O - mean O)^2)
 * Inputs: pairs in one unit, any.
 * Range: below 1 without limit; best 1; 0 is as good as the observed mean.
 * Read: squares let the largest flows decide. Monthly means score higher than daily values of the same run.
 * Undefined: fewer than two pairs, or observations all equal.
 * Variant: libraries that call this `r2_score` return 0 or 1 for equal observations; here it has no value.
 * Source: Nash & Sutcliffe 1970, J. Hydrol. 10(3):282-290; Moriasi et al. 2007, Trans. ASABE 50(3):885-900, eq. 1.
 * Example: nashSutcliffe(pairInOrder({observed: [10, 20, 30, 40], simulated: [11, 22, 33, 44]})) -> {value: 0.94}
 */
export function nashSutcliffe(paired: Paired): Statistic {
  const sums = moments(paired);
  const reason = withoutVariation(sums);
  if (reason) return undefinedBecause(reason);
  return computed(1 - sums.errorSquares / sums.observedSquares);
}
