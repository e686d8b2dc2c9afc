import { ascending } from '../arithmetic.ts';
import { computed, defined, type Statistic, undefinedBecause } from '../paired.ts';

export interface KolmogorovSmirnov {
  readonly distance: number;
  /** From the limiting distribution, good for samples that are not small. */
  readonly pLimit: number;
  /** Exact; undefined when a value occurs twice or the samples are long (over ten million pairs of values). */
  readonly pExact: Statistic;
}

/**
 * Two-sample Kolmogorov-Smirnov: the largest gap between two empirical distributions.
 *
 * Formula: D = max |F(x) - G(x)|; limiting p = 2 sum((-1)^(k-1) exp(-2 k^2 D^2 n m / (n + m)));
 * exact p = share of the lattice paths from (0, 0) to (n, m) that reach a gap of D
 * Inputs: two samples in one unit, independent values (annual, not daily).
 * Range: D 0 (alike) to 1 (no overlap); p 0 to 1.
 * Read: D is a size, p a doubt; with a thousand daily values everything differs, so use D or annual values.
 * Undefined: an empty sample. The exact p also when a value occurs twice, since ties break its counting.
 * Source: definition; exact p by counting paths, Hodges 1958, Ark. Mat. 3:469-486 (from memory).
 * Example: kolmogorovSmirnov({sample: [1, 2, 3], other: [2.5, 3.5, 4.5, 5.5]}) -> {value: {distance: 0.75}}
 */
export function kolmogorovSmirnov(of: {
  readonly sample: ArrayLike<number>;
  readonly other: ArrayLike<number>;
}): Statistic<KolmogorovSmirnov> {
  const n = of.sample.length;
  const m = of.other.length;
  if (n === 0 || m === 0) return undefinedBecause('one of the two samples is empty');
  // Whole numbers: a gap of i / n - j / m is compared as i m - j n.
  const gap = largestGap(ascending(of.sample), ascending(of.other));
  const distance = gap / (n * m);
  const tied = new Set([...Array.from(of.sample), ...Array.from(of.other)]).size < n + m;
  return defined({
    distance,
    pLimit: limitTail(distance * Math.sqrt((n * m) / (n + m))),
    pExact: exact({ n, m, gap, tied }),
  });
}

function exact(of: { n: number; m: number; gap: number; tied: boolean }): Statistic {
  if (of.tied) return undefinedBecause('a value occurs twice, which breaks the exact count');
  if (of.n * of.m > 1e7)
    return undefinedBecause('samples this long need no exact p; the limiting one is good');
  return computed(exactTail(of));
}

function largestGap(a: Float64Array, b: Float64Array): number {
  let largest = 0;
  let i = 0;
  let j = 0;
  while (i < a.length && j < b.length) {
    const value = Math.min(a[i] ?? 0, b[j] ?? 0);
    while (i < a.length && a[i] === value) i++;
    while (j < b.length && b[j] === value) j++;
    largest = Math.max(largest, Math.abs(i * b.length - j * a.length));
  }
  return largest;
}

/** The alternating sum converges quickly only above about 1; below it the theta-transformed sum does. */
function limitTail(x: number): number {
  if (x < 1e-2) return 1;
  let sum = 0;
  if (x < 1) {
    for (let k = 1; k <= 20; k++) sum += Math.exp(-(((2 * k - 1) * Math.PI) ** 2) / (8 * x * x));
    return 1 - (Math.sqrt(2 * Math.PI) / x) * sum;
  }
  for (let k = 1; k <= 20; k++) sum += (k % 2 === 1 ? 2 : -2) * Math.exp(-2 * k * k * x * x);
  return sum;
}

/** Chance that a random path has touched the gap on its way to (i, j): only sums of positive numbers, so small ones keep their digits. */
function exactTail({ n, m, gap }: { n: number; m: number; gap: number }): number {
  const touched = new Float64Array(m + 1);
  for (let i = 0; i <= n; i++)
    for (let j = 0; j <= m; j++) {
      if (Math.abs(i * m - j * n) >= gap) touched[j] = 1;
      else if (i + j === 0) touched[j] = 0;
      else touched[j] = (i * (i > 0 ? (touched[j] ?? 0) : 0) + j * (touched[j - 1] ?? 0)) / (i + j);
    }
  return touched[m] ?? Number.NaN;
}
