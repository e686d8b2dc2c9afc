import { ascending, median } from '../arithmetic.ts';
import { computedTogether, type Statistic, undefinedBecause } from '../paired.ts';
import { repeats } from './repeats.ts';

export interface SenSlope {
  /** Units of the values per unit of time. */
  readonly slope: number;
  readonly intercept: number;
  /** Ends of the 95 % confidence interval of the slope. */
  readonly lower95: number;
  readonly upper95: number;
}

/**
 * Sen's slope: the median of all slopes between two values, which a few outliers cannot turn.
 *
 * Formula: median of (x_j - x_i) / (t_j - t_i) over t_j > t_i; intercept = median(x) - slope median(t)
 * Inputs: times with their real gaps, such as years, and values, step beside step.
 * Range: any; 0 without trend.
 * Read: the size of a drift, in the unit of the values per unit of time; an interval that holds 0 leaves its sign open.
 * Undefined: fewer than two values, or times all equal.
 * Variant: the intercept through the medians, as most libraries have it.
 * Source: Sen 1968, J. Am. Stat. Assoc. 63:1379-1389 (from memory), with his interval.
 * Example: senSlope({times: [2000, 2001, 2004, 2005, 2009, 2010], values: [5, 4.2, 4.4, 3.1, 2, 2.5]}) -> {value: {slope: -0.275, intercept: 554.8875, lower95: -0.8, upper95: 0.0667}}
 */
export function senSlope(of: {
  readonly times: ArrayLike<number>;
  readonly values: ArrayLike<number>;
}): Statistic<SenSlope> {
  const { times, values } = of;
  const n = values.length;
  const slopes: number[] = [];
  for (let i = 0; i < n; i++)
    for (let j = 0; j < n; j++) {
      const run = (times[j] ?? 0) - (times[i] ?? 0);
      if (run > 0) slopes.push(((values[j] ?? 0) - (values[i] ?? 0)) / run);
    }
  if (slopes.length === 0) return undefinedBecause('a slope needs values at two different times');
  const sorted = ascending(slopes);
  const slope = median(slopes);
  const weight = (count: number) => count * (count - 1) * (2 * count + 5);
  const ties = [...repeats(values), ...repeats(times)].reduce((sum, count) => sum + weight(count), 0);
  const reach = 1.959963984540054 * Math.sqrt(Math.max(0, weight(n) - ties) / 18);
  const lower = Math.max(0, halfToEven((slopes.length - reach) / 2) - 1);
  const upper = Math.min(slopes.length - 1, halfToEven((slopes.length + reach) / 2));
  return computedTogether({
    slope,
    intercept: median(values) - slope * median(times),
    lower95: sorted[lower] ?? slope,
    upper95: sorted[upper] ?? slope,
  });
}

function halfToEven(value: number): number {
  const floor = Math.floor(value);
  if (value - floor !== 0.5) return Math.round(value);
  return floor % 2 === 0 ? floor : floor + 1;
}
