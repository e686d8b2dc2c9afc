import { mean, sampleDeviation } from '../arithmetic.ts';
import { defined, type Statistic, undefinedBecause } from '../paired.ts';

/** Calibrated conditions, one row per year (or other step), one column per driver; and a point of the scenario. */
export interface Conditions {
  readonly sample: readonly (readonly number[])[];
  readonly point: readonly number[];
}

/**
 * Conditions freed of their units: each driver less its mean, over its standard deviation.
 *
 * Formula: (x - mean) / sd of the sample, sd with n - 1
 * Inputs: sample rows and a point, each driver in its own unit.
 * Range: any; the point's size is in standard deviations.
 * Read: the step before any joint distance, so that millimetres do not outweigh degrees.
 * Undefined: rows of different length, fewer rows than drivers plus one, a driver that never varies.
 * Source: definition.
 * Example: standardized({sample: [[1, 9], [2, 7], [3, 8]], point: [3, 9]}) -> {value: {point: [1, 1]}}
 */
export function standardized(of: Conditions): Statistic<Conditions> {
  const drivers = of.point.length;
  if (drivers === 0 || of.sample.some((row) => row.length !== drivers))
    return undefinedBecause('every year needs a value of every driver');
  if (of.sample.length < drivers + 1)
    return undefinedBecause(
      `${of.sample.length} years are too few for ${drivers} drivers: at least ${drivers + 1}`,
    );
  const columns = of.point.map((_, driver) => of.sample.map((row) => row[driver] ?? Number.NaN));
  const means = columns.map(mean);
  const deviations = columns.map(sampleDeviation);
  if (deviations.includes(0))
    return undefinedBecause('a driver never varied in the calibration, so no distance can be told');
  const scale = (row: readonly number[]) =>
    row.map((value, driver) => (value - (means[driver] ?? 0)) / (deviations[driver] ?? 1));
  return defined({ sample: of.sample.map(scale), point: scale(of.point) });
}
