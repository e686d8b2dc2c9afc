/**
 * Peaks of a hydrograph: local maxima at or above a threshold that stand apart by a least distance, the higher kept.
 *
 * Formula: a value above both neighbours, or the middle (rounded down) of a run of equal values above both neighbours;
 * from the highest down, each peak removes those nearer than `minimumDistance`; of equal ones the later stays
 * Inputs: values in order of time, threshold in their unit; positions and distance in one unit of time, such as days.
 * Range: indices of the peaks, ascending; the first and last value are never peaks.
 * Read: neighbours are the values before and after in the list, also across a gap.
 * Undefined: never; no peak gives an empty list.
 * Source: the definition of SciPy's `signal.find_peaks(x, height, distance)`; no published standard is known.
 * Example: findPeaks({values: [1, 5, 2, 7, 7, 1], positions: [0, 1, 2, 3, 4, 5], threshold: 4, minimumDistance: 1}) -> [1, 3]
 */
export function findPeaks(series: {
  readonly values: ArrayLike<number>;
  readonly positions: ArrayLike<number>;
  readonly threshold: number;
  readonly minimumDistance: number;
}): number[] {
  const { values, positions, threshold, minimumDistance } = series;
  const at = (index: number) => values[index] ?? Number.NaN;
  const found = localMaxima(values).filter((index) => at(index) >= threshold);
  const kept: number[] = [];
  const byHeight = found.toSorted((a, b) => at(b) - at(a) || b - a);
  for (const peak of byHeight) {
    const near = (other: number) =>
      Math.abs((positions[peak] ?? 0) - (positions[other] ?? 0)) < minimumDistance - rounding;
    if (!kept.some(near)) kept.push(peak);
  }
  return kept.sort((a, b) => a - b);
}

/** Positions of hours are fractions of a day, whose differences are not exact. */
const rounding = 1e-6;

function localMaxima(values: ArrayLike<number>): number[] {
  const found: number[] = [];
  let first = 1;
  while (first < values.length - 1) {
    let last = first;
    const height = values[first] ?? Number.NaN;
    while (last < values.length - 1 && values[last + 1] === height) last++;
    const after = values[last + 1];
    if ((values[first - 1] ?? height) < height && after !== undefined && after < height)
      found.push((first + last) >> 1);
    first = last + 1;
  }
  return found;
}
