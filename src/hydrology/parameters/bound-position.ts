import { computed, defined, isDefined, type Statistic, undefinedBecause } from '../paired.ts';

export type BoundState = 'inside' | 'at lower bound' | 'at upper bound' | 'outside' | 'fixed';

export interface BoundPosition {
  /** 0 at the lower, 1 at the upper bound. */
  readonly position: number;
  readonly state: BoundState;
}

/**
 * Where a calibrated value lies in its range.
 *
 * Formula: (v - lower) / (upper - lower), of logarithms where the search was in logarithms; at a bound within the tolerance of its end
 * Inputs: value and range in one unit; tolerance as a share of the range, such as 0.01.
 * Range: position 0 to 1 inside.
 * Read: a value at its bound says that the range, the data or the structure decided, not the calibration.
 * Undefined: a lower bound above the upper; in logarithms, a value or bound that is not above 0. Equal bounds are fixed at 0.
 * Source: our choice; no published limit is known.
 * Example: boundPosition({value: 60.4, lower: 60, upper: 500, tolerance: 0.01, logarithmic: false}) -> {value: {position: 0.0009, state: 'at lower bound'}}
 */
export function boundPosition(of: {
  readonly value: number;
  readonly lower: number;
  readonly upper: number;
  readonly tolerance: number;
  readonly logarithmic: boolean;
}): Statistic<BoundPosition> {
  const { value, lower, upper, tolerance } = of;
  if (lower > upper) return undefinedBecause('the lower bound lies above the upper one');
  if (of.logarithmic && !(Math.min(value, lower) > 0))
    return undefinedBecause('a range searched in logarithms and its value lie above zero');
  if (lower === upper) return defined({ position: 0, state: value === lower ? 'fixed' : 'outside' });
  const scale = of.logarithmic ? Math.log : (plain: number) => plain;
  const position = computed((scale(value) - scale(lower)) / (scale(upper) - scale(lower)));
  if (!isDefined(position)) return position;
  return defined({ position: position.value, state: stateAt(position.value, tolerance) });
}

function stateAt(position: number, tolerance: number): BoundState {
  if (position < 0 || position > 1) return 'outside';
  if (position <= tolerance) return 'at lower bound';
  return position >= 1 - tolerance ? 'at upper bound' : 'inside';
}
