import { moments } from '../moments.ts';
import { computedTogether, isDefined, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { simulatedSumZero } from '../reasons.ts';
import { klingGupta2009 } from './kling-gupta-2009.ts';

export interface KlingGupta2012 {
  readonly efficiency: number;
  readonly r: number;
  /** Ratio of coefficients of variation, simulated over observed. */
  readonly gamma: number;
  /** Ratio of means, simulated over observed. */
  readonly beta: number;
}

/**
 * Kling-Gupta efficiency of 2012 (KGE'): as that of 2009, with variability freed of bias.
 *
 * Formula: 1 - sqrt((r - 1)^2 + (gamma - 1)^2 + (beta - 1)^2), gamma = (sd(S) / mean(S)) / (sd(O) / mean(O))
 * Inputs: pairs in one unit, any.
 * Range: below 1 without limit; best 1.
 * Read: as the form of 2009; a record must say which of the two it states.
 * Undefined: as the form of 2009, and when the simulation sums to zero.
 * Variant: `klingGupta2009`.
 * Source: Kling, Fuchs & Paulin 2012, J. Hydrol. 424-425:264-277.
 * Example: klingGupta2012(pairInOrder({observed: [10, 20, 30, 40], simulated: [11, 22, 33, 44]})) -> {value: {efficiency: 0.9, r: 1, gamma: 1, beta: 1.1}}
 */
export function klingGupta2012(paired: Paired): Statistic<KlingGupta2012> {
  const older = klingGupta2009(paired);
  if (!isDefined(older)) return older;
  if (moments(paired).simulatedSumIsZero) return undefinedBecause(simulatedSumZero);
  const { r, alpha, beta } = older.value;
  const gamma = alpha / beta;
  return computedTogether({ efficiency: 1 - Math.hypot(r - 1, gamma - 1, beta - 1), r, gamma, beta });
}
