import { computed, type Statistic, undefinedBecause } from '../paired.ts';
import type { Band } from './band.ts';
import { withoutBand } from './crossed-steps.ts';

/**
 * Coverage (published as P-factor): share of the observations that the band holds.
 *
 * Formula: steps with lower <= observed <= upper / steps
 * Inputs: a band, one unit.
 * Range: 0 to 1, a share and not percent; best near the level of the band.
 * Read: only beside the relative width: a band of any width covers everything. Advice: above 0.7 for flow.
 * Undefined: no steps, or a band that is upside down anywhere.
 * Variant: both ends belong to the band (our choice).
 * Source: Abbaspour, Johnson & van Genuchten 2004, Vadose Zone J. 3:1340-1352; advice of Abbaspour et al. 2007, J. Hydrol. 333:413-430 (from memory).
 * Example: coverage(bandInOrder({observed: [1, 2, 3.5], lower: [0.8, 2, 3.6], upper: [1.5, 2.9, 4.8]})) -> {value: 0.6667}
 */
export function coverage(band: Band): Statistic {
  const reason = withoutBand(band);
  if (reason) return undefinedBecause(reason);
  const inside = band.observed.filter(
    (value, step) => value >= (band.lower[step] ?? Number.NaN) && value <= (band.upper[step] ?? Number.NaN),
  );
  return computed(inside.length / band.observed.length);
}
