import { moments } from '../moments.ts';
import { computed, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { constantSimulated, withoutVariation } from '../reasons.ts';

/**
 * Pearson correlation (r): whether simulation and observation rise and fall together.
 *
 * Formula: sum((O - mean O)(S - mean S)) / sqrt(sum((O - mean O)^2) sum((S - mean S)^2))
 * Inputs: pairs, any units.
 * Range: -1 to 1; best 1.
 * Read: blind to bias and to scale: twice the flow still gives 1.
 * Undefined: fewer than two pairs, or either side all equal.
 * Source: definition; Moriasi et al. 2007, Trans. ASABE 50(3):885-900, standard regression.
 * Example: correlation(pairInOrder({observed: [1, 2, 3], simulated: [2, 4, 7]})) -> {value: 0.9934}
 */
export function correlation(paired: Paired): Statistic {
  const sums = moments(paired);
  const reason = withoutVariation(sums);
  if (reason) return undefinedBecause(reason);
  if (sums.simulatedSquares === 0) return undefinedBecause(constantSimulated);
  const r = sums.products / (Math.sqrt(sums.observedSquares) * Math.sqrt(sums.simulatedSquares));
  // Rounding alone can carry a perfect correlation past 1.
  return computed(Math.max(-1, Math.min(1, r)));
}
