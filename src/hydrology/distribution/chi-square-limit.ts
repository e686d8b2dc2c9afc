import { chiSquareTail } from './chi-square-tail.ts';

/**
 * The value that a chi-square variable exceeds with a given chance.
 *
 * Formula: the x with `chiSquareTail` = p, by halving the interval
 * Inputs: chance p between 0 and 1; degrees of freedom, a whole number from 1.
 * Range: above 0.
 * Read: with p = 0.025 the usual limit of a squared Mahalanobis distance.
 * Undefined: never for such inputs.
 * Source: definition.
 * Example: chiSquareLimit({exceeded: 0.025, degrees: 2}) -> 7.3778
 */
export function chiSquareLimit(of: { readonly exceeded: number; readonly degrees: number }): number {
  let low = 0;
  let high = 1;
  while (chiSquareTail({ x: high, degrees: of.degrees }) > of.exceeded) high *= 2;
  for (let halving = 0; halving < 100; halving++) {
    const middle = (low + high) / 2;
    if (chiSquareTail({ x: middle, degrees: of.degrees }) > of.exceeded) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
