import type { Value } from '../paired.ts';

export interface Run {
  /** Indices from 0, both included. */
  readonly first: number;
  readonly last: number;
  readonly length: number;
  readonly value: number;
}

/**
 * Runs of one equal value: a gauge that is stuck, or values filled in by hand.
 *
 * Formula: longest stretches of x_t = x_t+1, of at least the stated length
 * Inputs: values in order of time, missing ones null or not finite; `of` says whether non-zero or zero runs are wanted.
 * Range: a list in order of time; best empty.
 * Read: non-zero rain or flow rarely repeats to the last digit; runs of zero are weather, see `longestDrySpells`.
 * Undefined: never; a missing value ends a run.
 * Source: WMO-No. 305, Guide on the Global Data-Processing System, persistence checks (practice); length is our choice.
 * Example: stuckRuns({values: [0, 0, 0, 3.4, 3.4, 3.4, null, 3.4], minimumLength: 3, of: 'non-zero'}) -> [{first: 3, last: 5, length: 3, value: 3.4}]
 */
export function stuckRuns(series: {
  readonly values: ArrayLike<Value>;
  readonly minimumLength: number;
  readonly of: 'non-zero' | 'zero';
}): Run[] {
  const { values } = series;
  const runs: Run[] = [];
  let first = 0;
  while (first < values.length) {
    const value = values[first];
    let last = first;
    while (last + 1 < values.length && values[last + 1] === value) last++;
    const length = last - first + 1;
    const wanted = (value === 0) === (series.of === 'zero');
    if (typeof value === 'number' && Number.isFinite(value) && wanted && length >= series.minimumLength)
      runs.push({ first, last, length, value });
    first = last + 1;
  }
  return runs;
}
