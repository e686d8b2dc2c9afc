import { mean } from '../arithmetic.ts';
import { computed, type Statistic, undefinedBecause } from '../paired.ts';
import type { Band } from './band.ts';
import { withoutBand } from './crossed-steps.ts';

/**
 * Mean width of a band.
 *
 * Formula: mean(upper - lower)
 * Inputs: a band, one unit; the result is in that unit.
 * Range: 0 upwards.
 * Read: what the reader of a graph sees; the relative width compares it with the spread of the observations.
 * Undefined: no steps, or a band that is upside down anywhere.
 * Source: definition.
 * Example: meanWidth(bandInOrder({observed: [1, 2], lower: [0, 1], upper: [2, 5]})) -> {value: 3}
 */
export function meanWidth(band: Band): Statistic {
  const reason = withoutBand(band);
  if (reason) return undefinedBecause(reason);
  return computed(mean(band.upper.map((upper, step) => upper - (band.lower[step] ?? 0))));
}
