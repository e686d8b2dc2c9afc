import { isConstant, sampleDeviation } from '../arithmetic.ts';
import { computed, isDefined, type Statistic, undefinedBecause } from '../paired.ts';
import { constantObserved } from '../reasons.ts';
import type { Band } from './band.ts';
import { meanWidth } from './mean-width.ts';

/**
 * Relative width (published as R-factor): mean width of the band over the standard deviation of the observations.
 *
 * Formula: mean(upper - lower) / sd(O)
 * Inputs: a band, one unit.
 * Range: 0 upwards; best small while the coverage stays at its level. Advice: below 1.5 for flow.
 * Read: only beside the coverage: a band of no width has 0.
 * Undefined: fewer than two steps, observations all equal, or a band that is upside down anywhere.
 * Variant: sd with n - 1 (the source does not say); with n the figure is 0.14 % larger for a year of days.
 * Source: Abbaspour, Johnson & van Genuchten 2004, Vadose Zone J. 3:1340-1352; advice of Abbaspour et al. 2007, J. Hydrol. 333:413-430 (from memory).
 * Example: relativeWidth(bandInOrder({observed: [1, 3], lower: [0, 1], upper: [2, 5]})) -> {value: 2.1213}
 */
export function relativeWidth(band: Band): Statistic {
  const width = meanWidth(band);
  if (!isDefined(width)) return width;
  if (isConstant(band.observed)) return undefinedBecause(constantObserved);
  return computed(width.value / sampleDeviation(band.observed));
}
