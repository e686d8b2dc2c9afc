/**
 * Sum that keeps the digits small terms would lose beside large ones (Neumaier 1974, from memory).
 * Example: total([1e100, 1, -1e100]) -> 1
 */
export function total(values: ArrayLike<number>): number {
  let sum = 0;
  let lost = 0;
  for (let index = 0; index < values.length; index++) {
    const value = values[index] ?? 0;
    const next = sum + value;
    lost += Math.abs(sum) >= Math.abs(value) ? sum - next + value : value - next + sum;
    sum = next;
  }
  return Number.isFinite(lost) ? sum + lost : sum;
}

/** Example: mean([1, 2, 6]) -> 3 */
export function mean(values: ArrayLike<number>): number {
  return total(values) / values.length;
}

/**
 * True when all values are equal; then deviations from a rounded mean must not pass for variation.
 * Example: isConstant([0.1, 0.1, 0.1]) -> true
 */
export function isConstant(values: ArrayLike<number>): boolean {
  for (let index = 1; index < values.length; index++) if (values[index] !== values[0]) return false;
  return true;
}

/**
 * Sum of squared deviations from the mean, in two passes; exactly 0 for equal values.
 * Example: squaredDeviations([1, 2, 3, 6]) -> 14
 */
export function squaredDeviations(values: ArrayLike<number>): number {
  if (isConstant(values)) return 0;
  const centre = mean(values);
  let sum = 0;
  for (let index = 0; index < values.length; index++) sum += ((values[index] ?? 0) - centre) ** 2;
  return sum;
}

/**
 * Standard deviation with n - 1.
 * Example: sampleDeviation([1, 2, 3, 6]) -> 2.1602
 */
export function sampleDeviation(values: ArrayLike<number>): number {
  return Math.sqrt(squaredDeviations(values) / (values.length - 1));
}

/** Example: ascending([3, 1, 2]) -> [1, 2, 3] */
export function ascending(values: ArrayLike<number>): Float64Array {
  return Float64Array.from(values).sort();
}

/** Example: median([4, 1, 3, 2]) -> 2.5 */
export function median(values: ArrayLike<number>): number {
  const sorted = ascending(values);
  const middle = sorted.length >> 1;
  const upper = sorted[middle] ?? Number.NaN;
  return sorted.length % 2 === 1 ? upper : ((sorted[middle - 1] ?? Number.NaN) + upper) / 2;
}

/**
 * True when a sum is 0 as far as its rounding allows saying, so that nothing may be divided by it.
 * Example: sumsToZero([0.1, 0.2, -0.3]) -> true
 */
export function sumsToZero(values: ArrayLike<number>): boolean {
  let magnitude = 0;
  for (let index = 0; index < values.length; index++) magnitude += Math.abs(values[index] ?? 0);
  return Math.abs(total(values)) <= values.length * Number.EPSILON * magnitude;
}
