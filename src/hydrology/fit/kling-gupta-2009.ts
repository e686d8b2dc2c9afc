import { computedTogether, isDefined, type Paired, type Statistic } from '../paired.ts';
import { biasRatio } from './bias-ratio.ts';
import { correlation } from './correlation.ts';
import { variabilityRatio } from './variability-ratio.ts';

export interface KlingGupta2009 {
  readonly efficiency: number;
  readonly r: number;
  /** Ratio of standard deviations, simulated over observed. */
  readonly alpha: number;
  /** Ratio of means, simulated over observed. */
  readonly beta: number;
}

/** The efficiency of the observed mean as a simulation, with r = 0 by convention: 1 - sqrt 2 (Knoben et al. 2019, Hydrol. Earth Syst. Sci. 23:4323-4331). */
export const klingGuptaOfTheMean = 1 - Math.SQRT2;

/**
 * Kling-Gupta efficiency of 2009 (KGE): distance of correlation, variability and bias from their best, in one number.
 *
 * Formula: 1 - sqrt((r - 1)^2 + (alpha - 1)^2 + (beta - 1)^2), alpha = sd(S) / sd(O), beta = mean(S) / mean(O)
 * Inputs: pairs in one unit, any.
 * Range: below 1 without limit; best 1; the observed mean as simulation reaches 1 - sqrt 2 = -0.41, not 0.
 * Read: look at the three parts: they say whether timing, spread or volume is at fault.
 * Undefined: fewer than two pairs, either side all equal, or observations that sum to zero.
 * Variant: `klingGupta2012` compares coefficients of variation in place of deviations.
 * Source: Gupta, Kling, Yilmaz & Martinez 2009, J. Hydrol. 377:80-91.
 * Example: klingGupta2009(pairInOrder({observed: [10, 20, 30, 40], simulated: [11, 22, 33, 44]})) -> {value: {efficiency: 0.8586, r: 1, alpha: 1.1, beta: 1.1}}
 */
export function klingGupta2009(paired: Paired): Statistic<KlingGupta2009> {
  const r = correlation(paired);
  if (!isDefined(r)) return r;
  const alpha = variabilityRatio(paired);
  if (!isDefined(alpha)) return alpha;
  const beta = biasRatio(paired);
  if (!isDefined(beta)) return beta;
  const efficiency = 1 - Math.hypot(r.value - 1, alpha.value - 1, beta.value - 1);
  return computedTogether({ efficiency, r: r.value, alpha: alpha.value, beta: beta.value });
}
