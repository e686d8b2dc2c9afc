import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * How far a value lies outside the calibrated range, as a share of that range.
 *
 * Formula: distance outside [lowest, highest] / (highest - lowest); 0 inside
 * Inputs: value and range in one unit.
 * Range: 0 upwards; best 0.
 * Read: inside every single range is not inside the joint domain.
 * Undefined: a range without width that the value leaves, or upside down.
 * Source: our choice.
 * Example: rangeExceedance({value: 700, lowest: 760, highest: 1105}) -> {value: 0.1739}
 */
export function rangeExceedance(of: {
  readonly value: number;
  readonly lowest: number;
  readonly highest: number;
}): Statistic {
  const outside = Math.max(0, of.lowest - of.value, of.value - of.highest);
  if (of.lowest > of.highest) return undefinedBecause('the range is upside down');
  if (outside === 0) return computed(0);
  if (of.lowest === of.highest) return undefinedBecause('the calibrated range has no width to measure by');
  return computed(outside / (of.highest - of.lowest));
}
