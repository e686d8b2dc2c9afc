/**
 * Ranks from 1, equal values sharing the mean of their ranks.
 *
 * Formula: mean of the places that a value takes in ascending order
 * Inputs: values in one unit, in any order.
 * Range: 1 to n.
 * Read: the input of rank tests.
 * Undefined: never.
 * Source: definition (midranks).
 * Example: ranks([10, 30, 10, 20]) -> [1.5, 4, 1.5, 3]
 */
export function ranks(values: ArrayLike<number>): Float64Array {
  const at = (index: number | undefined) => values[index ?? -1] ?? Number.NaN;
  const order = Array.from(values, (_, index) => index).sort((a, b) => at(a) - at(b));
  const result = new Float64Array(values.length);
  let first = 0;
  while (first < order.length) {
    let last = first;
    while (last + 1 < order.length && at(order[last + 1]) === at(order[first])) last++;
    for (const index of order.slice(first, last + 1)) result[index] = (first + last) / 2 + 1;
    first = last + 1;
  }
  return result;
}
