import { moments } from '../moments.ts';
import { computedTogether, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { constantSimulated, withoutVariation } from '../reasons.ts';

export interface Line {
  /** Simulated units per observed unit. */
  readonly gradient: number;
  /** In simulated units. */
  readonly intercept: number;
}

/**
 * Least-squares line of the simulation on the observations: what R2 alone hides.
 *
 * Formula: gradient = sum((O - mean O)(S - mean S)) / sum((O - mean O)^2); intercept = mean S - gradient mean O
 * Inputs: pairs, observed along x, simulated along y.
 * Range: any; best gradient 1 with intercept 0.
 * Read: a gradient under 1 with a positive intercept is the usual sign of peaks too low and low flows too high.
 * Undefined: fewer than two pairs, or either side all equal.
 * Source: Moriasi et al. 2007, Trans. ASABE 50(3):885-900, standard regression.
 * Example: regression(pairInOrder({observed: [1, 2, 3], simulated: [3, 5, 7]})) -> {value: {gradient: 2, intercept: 1}}
 */
export function regression(paired: Paired): Statistic<Line> {
  const sums = moments(paired);
  const reason = withoutVariation(sums);
  if (reason) return undefinedBecause(reason);
  if (sums.simulatedSquares === 0) return undefinedBecause(constantSimulated);
  const gradient = sums.products / sums.observedSquares;
  return computedTogether({ gradient, intercept: sums.simulatedMean - gradient * sums.observedMean });
}
