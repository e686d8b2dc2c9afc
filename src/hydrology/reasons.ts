import type { Moments } from './moments.ts';

export const noPairs = 'no step has both an observed and a simulated value';
export const constantObserved = 'the observed values are all equal, so there is no variation to explain';
export const constantSimulated = 'the simulated values are all equal, so they vary with nothing';
export const observedSumZero = 'the observed values sum to zero, so nothing can be stated relative to them';
export const simulatedSumZero = 'the simulated values sum to zero, so nothing can be stated relative to them';
export const negativeFlow = 'a flow is negative, which has no logarithm';

/**
 * Why scores that compare with the variation of the observations have no value; null when they have one.
 * Example: withoutVariation({pairs: 3, observedSquares: 0}) -> 'the observed values are all equal, so there is no variation to explain'
 */
export function withoutVariation(of: Pick<Moments, 'pairs' | 'observedSquares'>): string | null {
  if (of.pairs === 0) return noPairs;
  if (of.pairs === 1) return 'one pair has no variation to explain';
  return of.observedSquares === 0 ? constantObserved : null;
}

/**
 * Why scores relative to the sum of the observations have no value; null when they have one.
 * Example: withoutSum({pairs: 2, observedSumIsZero: true}) -> 'the observed values sum to zero, so nothing can be stated relative to them'
 */
export function withoutSum(of: Pick<Moments, 'pairs' | 'observedSumIsZero'>): string | null {
  if (of.pairs === 0) return noPairs;
  return of.observedSumIsZero ? observedSumZero : null;
}
