import { mean, squaredDeviations } from '../arithmetic.ts';
import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * Lag-one autocorrelation: how much a value resembles the one before it.
 *
 * Formula: sum((x_t - mean)(x_t+1 - mean)) / sum((x_t - mean)^2)
 * Inputs: values in order of time, one unit, no gaps.
 * Range: -1 to 1; 0 without persistence.
 * Read: well above 0, trend and change-point tests claim too much.
 * Undefined: fewer than two values, or values all equal.
 * Variant: both sums about the mean of the whole record.
 * Source: usual estimator (Box & Jenkins 1970, from memory).
 * Example: lagOneCorrelation([1, 2, 3, 4]) -> {value: 0.25}
 */
export function lagOneCorrelation(values: ArrayLike<number>): Statistic {
  if (values.length < 2) return undefinedBecause('persistence needs at least two values');
  const squares = squaredDeviations(values);
  if (squares === 0) return undefinedBecause('the values are all equal');
  const centre = mean(values);
  let products = 0;
  for (let t = 0; t + 1 < values.length; t++)
    products += ((values[t] ?? 0) - centre) * ((values[t + 1] ?? 0) - centre);
  return computed(products / squares);
}
