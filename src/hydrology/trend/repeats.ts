/**
 * How often each distinct value occurs.
 *
 * Formula: count of equal values
 * Inputs: values in any order.
 * Range: counts from 1, in order of first occurrence.
 * Read: the tie counts of rank tests.
 * Undefined: never.
 * Source: definition.
 * Example: repeats([3, 3, 4, 4, 4, 5]) -> [2, 3, 1]
 */
export function repeats(values: ArrayLike<number>): number[] {
  const counts = new Map<number, number>();
  for (const value of Array.from(values)) counts.set(value, (counts.get(value) ?? 0) + 1);
  return [...counts.values()];
}
