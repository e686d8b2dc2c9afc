import { normalTails } from './normal-tails.ts';

/**
 * Upper tail of the chi-square distribution: chance of exceeding x.
 *
 * Formula: Q_1 = erfc(sqrt(x / 2)), Q_2 = exp(-x / 2), Q_k = Q_(k-2) + (x / 2)^(k/2 - 1) exp(-x / 2) / Gamma(k / 2)
 * Inputs: x from 0, no unit; degrees of freedom k, a whole number from 1.
 * Range: 0 to 1.
 * Read: the p value of a squared distance in k directions.
 * Undefined: never for such inputs.
 * Source: Abramowitz & Stegun 1964, Handbook of Mathematical Functions, 26.4.4 and 26.4.5 (from memory).
 * Example: chiSquareTail({x: 7.377758908, degrees: 2}) -> 0.025
 */
export function chiSquareTail(of: { readonly x: number; readonly degrees: number }): number {
  const half = of.x / 2;
  const odd = of.degrees % 2 === 1;
  let tail = odd ? normalTails(Math.sqrt(of.x)) : Math.exp(-half);
  // Gamma(1/2) = sqrt(pi), Gamma(1) = 1, and Gamma(z + 1) = z Gamma(z).
  let term = odd ? (Math.exp(-half) * Math.sqrt(half)) / (Math.sqrt(Math.PI) / 2) : Math.exp(-half) * half;
  for (let degrees = odd ? 3 : 4; degrees <= of.degrees; degrees += 2) {
    tail += term;
    term *= half / (degrees / 2);
  }
  return tail;
}
