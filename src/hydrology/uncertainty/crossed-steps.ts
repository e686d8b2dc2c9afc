import type { Band } from './band.ts';

/**
 * Steps on which a band is upside down.
 *
 * Formula: indices with lower > upper
 * Inputs: a band, one unit.
 * Range: a list; best empty.
 * Read: such a band is no band; a step of it is not a miss.
 * Undefined: never.
 * Source: definition.
 * Example: crossedSteps(bandInOrder({observed: [1, 1], lower: [0, 2], upper: [2, 0]})) -> [1]
 */
export function crossedSteps(band: Band): number[] {
  return Array.from(band.lower, (_, step) => step).filter(
    (step) => (band.lower[step] ?? 0) > (band.upper[step] ?? 0),
  );
}

/**
 * Why figures of a band have no value; null when they have one.
 *
 * Formula: none
 * Inputs: a band.
 * Range: a reason, or null.
 * Read: shared by the figures of a band.
 * Undefined: never.
 * Source: definition.
 * Example: withoutBand(bandInOrder({observed: [1], lower: [0], upper: [2]})) -> null
 */
export function withoutBand(band: Band): string | null {
  if (band.observed.length === 0) return 'no step has an observation and both ends of the band';
  const crossed = crossedSteps(band).length;
  return crossed === 0 ? null : `the lower end lies above the upper one on ${crossed} steps: this is no band`;
}
