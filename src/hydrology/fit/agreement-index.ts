import { moments } from '../moments.ts';
import { computed, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { withoutVariation } from '../reasons.ts';

/**
 * Index of agreement (d): squared error against the largest it could have been around the observed mean.
 *
 * Formula: 1 - sum((O - S)^2) / sum((|S - mean O| + |O - mean O|)^2)
 * Inputs: pairs in one unit, any.
 * Range: 0 to 1; best 1.
 * Read: high for poor models too: a run no better than the mean can pass 0.6.
 * Undefined: fewer than two pairs, or observations all equal (then it is 0 whatever was simulated).
 * Source: Willmott 1981, Phys. Geogr. 2:184-194; described in Moriasi et al. 2007, Trans. ASABE 50(3):885-900.
 * Example: agreementIndex(pairInOrder({observed: [10, 20, 30, 40], simulated: [11, 22, 33, 44]})) -> {value: 0.9865}
 */
export function agreementIndex(paired: Paired): Statistic {
  const sums = moments(paired);
  const reason = withoutVariation(sums);
  if (reason) return undefinedBecause(reason);
  let potential = 0;
  for (let index = 0; index < sums.pairs; index++) {
    const o = Math.abs((paired.observed[index] ?? 0) - sums.observedMean);
    const s = Math.abs((paired.simulated[index] ?? 0) - sums.observedMean);
    potential += (o + s) ** 2;
  }
  return computed(1 - sums.errorSquares / potential);
}
