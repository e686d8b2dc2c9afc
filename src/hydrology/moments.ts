import { isConstant, mean, squaredDeviations, sumsToZero } from './arithmetic.ts';
import type { Paired } from './paired.ts';

/** The sums that most scores are made of, each over the pairs and about the means of the pairs. */
export interface Moments {
  readonly pairs: number;
  readonly observedMean: number;
  readonly simulatedMean: number;
  /** Sums of squared deviations from the own mean; exactly 0 for equal values. */
  readonly observedSquares: number;
  readonly simulatedSquares: number;
  /** Sum of products of both deviations. */
  readonly products: number;
  /** Sum of (O - S)^2. */
  readonly errorSquares: number;
  /** Observations that sum to 0 cannot be divided by, and neither can simulations. */
  readonly observedSumIsZero: boolean;
  readonly simulatedSumIsZero: boolean;
}

/** Example: moments(pairInOrder({observed: [1, 3], simulated: [2, 2]})).observedSquares -> 2 */
export function moments(paired: Paired): Moments {
  const { observed, simulated } = paired;
  const observedMean = mean(observed);
  const simulatedMean = mean(simulated);
  const varies = !isConstant(observed) && !isConstant(simulated);
  let products = 0;
  let errorSquares = 0;
  for (let index = 0; index < observed.length; index++) {
    const o = observed[index] ?? 0;
    const s = simulated[index] ?? 0;
    if (varies) products += (o - observedMean) * (s - simulatedMean);
    errorSquares += (o - s) ** 2;
  }
  return {
    pairs: observed.length,
    observedMean,
    simulatedMean,
    observedSquares: squaredDeviations(observed),
    simulatedSquares: squaredDeviations(simulated),
    products,
    errorSquares,
    observedSumIsZero: sumsToZero(observed),
    simulatedSumIsZero: sumsToZero(simulated),
  };
}
