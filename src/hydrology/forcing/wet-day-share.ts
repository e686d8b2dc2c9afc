import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * Share of days with rain.
 *
 * Formula: days at or above the threshold / days
 * Inputs: daily rainfall and threshold in mm; 1 mm is usual.
 * Range: 0 to 1.
 * Read: gridded products rain too often and too little at a time; totals hide it.
 * Undefined: no days.
 * Source: common practice (wet day of 1 mm).
 * Example: wetDayShare({rainMm: [0, 0.4, 1, 12], thresholdMm: 1}) -> {value: 0.5}
 */
export function wetDayShare(of: {
  readonly rainMm: ArrayLike<number>;
  readonly thresholdMm: number;
}): Statistic {
  const days = of.rainMm.length;
  if (days === 0) return undefinedBecause('there are no days');
  return computed(Array.from(of.rainMm).filter((rain) => rain >= of.thresholdMm).length / days);
}
