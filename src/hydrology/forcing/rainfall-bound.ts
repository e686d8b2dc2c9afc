import { defined, type Statistic, undefinedBecause } from '../paired.ts';
import { type RainfallRecord, rainfallRecords } from '../tables/rainfall-records.ts';

/**
 * The most rain that was ever measured within a duration: an upper bound for one value.
 *
 * Formula: the record of the shortest listed duration that is at least as long
 * Inputs: duration in hours; depths in mm.
 * Range: 31 mm (a minute) to 26 470 mm (twelve months).
 * Read: a larger value is an error: a counter that runs on, tenths of millimetres, or a missing code.
 * Undefined: a duration that is not above zero, or over twelve months.
 * Variant: a fixed day catches less than any 24 hours (1.13 times less on average: Hershfield 1961, from memory), so the bound is safe for daily totals.
 * Source: WMO World Weather and Climate Extremes Archive; WMO press release 988.
 * Example: rainfallBound(24) -> {value: {mm: 1825}}
 */
export function rainfallBound(durationHours: number): Statistic<RainfallRecord> {
  if (!(durationHours > 0)) return undefinedBecause('a duration is above zero');
  const record = rainfallRecords.find(({ hours }) => hours >= durationHours);
  return record ? defined(record) : undefinedBecause('no record covers more than twelve months');
}
