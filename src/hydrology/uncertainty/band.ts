import type { Value } from '../paired.ts';

/** Observations with the band that is meant to hold them, step beside step, every value finite; one unit. */
export interface Band {
  readonly observed: Float64Array;
  readonly lower: Float64Array;
  readonly upper: Float64Array;
}

/**
 * Sets observations beside a band, a step being dropped when any of the three is missing or not finite.
 * Throws a RangeError when the lists differ in length.
 *
 * Formula: none
 * Inputs: three lists in order of time, one unit.
 * Range: as many steps as all three hold.
 * Read: use the validation window; a band may cover only what it was fitted to.
 * Undefined: never.
 * Source: definition.
 * Example: bandInOrder({observed: [1, null], lower: [0, 0], upper: [2, 2]}) -> {observed: [1], lower: [0], upper: [2]}
 */
export function bandInOrder(sides: {
  readonly observed: ArrayLike<Value>;
  readonly lower: ArrayLike<Value>;
  readonly upper: ArrayLike<Value>;
}): Band {
  const { observed, lower, upper } = sides;
  if (observed.length !== lower.length || observed.length !== upper.length)
    throw new RangeError(
      `${observed.length} observed, ${lower.length} lower and ${upper.length} upper values`,
    );
  const present = (value: Value | undefined) => typeof value === 'number' && Number.isFinite(value);
  const kept = Array.from(observed, (_, step) => step).filter((step) =>
    [observed[step], lower[step], upper[step]].every(present),
  );
  const side = (values: ArrayLike<Value>) => Float64Array.from(kept, (step) => values[step] ?? Number.NaN);
  return { observed: side(observed), lower: side(lower), upper: side(upper) };
}
