/** Places of times in rising order, of equal ones in their own order; null where they rise already. */
export function risingOrder(times: Float64Array): Uint32Array | null {
  let rises = true;
  for (let place = 1; place < times.length && rises; place++)
    rises = (times[place - 1] as number) <= (times[place] as number);
  if (rises) return null;
  const order = Uint32Array.from(times.keys());
  return order.sort((one, other) => (times[one] as number) - (times[other] as number) || one - other);
}

/** Fills `to` from the beginning of `from`, or in that order. */
export function copied<T extends Float64Array | Uint32Array>(
  from: Float64Array,
  to: T,
  order: Uint32Array | null,
): T {
  if (order === null) to.set(from.length > to.length ? from.subarray(0, to.length) : from);
  else for (let place = 0; place < to.length; place++) to[place] = from[order[place] as number] as number;
  return to;
}
