import { chiSquareLimit } from '../distribution/chi-square-limit.ts';
import { chiSquareTail } from '../distribution/chi-square-tail.ts';
import { computedTogether, isDefined, type Statistic, undefinedBecause } from '../paired.ts';
import { type Conditions, standardized } from './standardized.ts';

export interface JointDistance {
  /** Distance in standard deviations, correlation taken into account. */
  readonly distance: number;
  readonly squared: number;
  /** Chance of a larger distance under a joint normal distribution. */
  readonly p: number;
  /** The square that 2.5 % exceed. */
  readonly limit: number;
  readonly beyond: boolean;
  /** 1 / n + d^2 / (n - 1). */
  readonly leverage: number;
}

/**
 * Mahalanobis distance of scenario conditions from the calibrated ones: how unusual their combination is.
 *
 * Formula: d^2 = (x - mean)' C^-1 (x - mean), C the covariance with n - 1; beyond when d^2 > chi-square(k, 0.975); leverage h = 1 / n + d^2 / (n - 1)
 * Inputs: one row of drivers per year of the calibration, and the point; each driver in its own unit.
 * Range: 0 upwards; best small.
 * Read: a hot and wet year may lie inside both ranges and still be unheard of. Leverage is the same test on another scale.
 * Undefined: as `standardized`; drivers that depend on each other exactly (rainfall and its double).
 * Variant: some libraries return the square, or divide the covariance by n.
 * Source: Mahalanobis 1936 (from memory); limit: usual practice for outliers in several variables (from memory).
 * Example: mahalanobis({sample: [[1, 1], [2, 3], [3, 2], [4, 4]], point: [4, 1]}) -> {value: {squared: 13.5, beyond: true, leverage: 4.75}}
 */
export function mahalanobis(of: Conditions): Statistic<JointDistance> {
  const scaled = standardized(of);
  if (!isDefined(scaled)) return scaled;
  const { sample, point } = scaled.value;
  const years = sample.length;
  const covariance = point.map((_, a) =>
    point.map((__, b) => sample.reduce((sum, row) => sum + (row[a] ?? 0) * (row[b] ?? 0), 0) / (years - 1)),
  );
  const squared = squaredLength(covariance, point);
  if (squared === null)
    return undefinedBecause('the drivers depend on each other exactly, so their joint distance has no value');
  const limit = chiSquareLimit({ exceeded: 0.025, degrees: point.length });
  return computedTogether({
    distance: Math.sqrt(squared),
    squared,
    p: chiSquareTail({ x: squared, degrees: point.length }),
    limit,
    beyond: squared > limit,
    leverage: 1 / years + squared / (years - 1),
  });
}

/** x' C^-1 x by the Cholesky factor of a correlation matrix; null when that is singular. */
function squaredLength(matrix: readonly (readonly number[])[], vector: readonly number[]): number | null {
  const factor: number[][] = [];
  const solved: number[] = [];
  for (const [i, row] of matrix.entries()) {
    const own: number[] = [];
    for (let j = 0; j <= i; j++) {
      const known = own.slice(0, j).reduce((sum, value, k) => sum + value * (factor[j]?.[k] ?? 0), 0);
      const rest = (row[j] ?? 0) - (j === i ? own.reduce((sum, value) => sum + value * value, 0) : known);
      if (j === i && rest < 1e-10) return null;
      own.push(j === i ? Math.sqrt(rest) : rest / (factor[j]?.[j] ?? 1));
    }
    factor.push(own);
    const used = solved.reduce((sum, value, k) => sum + value * (own[k] ?? 0), 0);
    solved.push(((vector[i] ?? 0) - used) / (own[i] ?? 1));
  }
  return solved.reduce((sum, value) => sum + value * value, 0);
}
