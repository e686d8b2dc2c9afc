import { computed, isDefined, type Statistic, undefinedBecause } from '../paired.ts';
import { mahalanobis } from './mahalanobis.ts';
import { type Conditions, standardized } from './standardized.ts';

/**
 * How far scenario conditions lie outside the convex hull of the calibrated ones; 0 inside it.
 *
 * Formula: distance from the point to the nearest mixture of calibrated years, each driver in its standard deviations (n - 1)
 * Inputs: one row of up to three drivers per year of the calibration, and the point; each driver in its own unit.
 * Range: 0 upwards; 0 is inside or on the hull.
 * Read: outside the hull a model extrapolates, whatever the single ranges say. With few years nearly everything is outside.
 * Undefined: as `mahalanobis`; more than three drivers, where the hull says nothing any more.
 * Source: hull as the test of extrapolation: King & Zeng 2006, Political Analysis 14:131-159 (from memory); nearest point: Wolfe 1976, Math. Program. 11:128-149 (from memory).
 * Example: hullDistance({sample: [[0, 0], [2, 0], [0, 2], [2, 2]], point: [1, 1]}) -> {value: 0}
 */
export function hullDistance(of: Conditions): Statistic {
  if (of.point.length > 3)
    return undefinedBecause('with more than three drivers nearly every point lies outside the hull');
  const joint = mahalanobis(of);
  if (!isDefined(joint)) return joint;
  const scaled = standardized(of);
  if (!isDefined(scaled)) return scaled;
  const { sample, point } = scaled.value;
  const from = sample.map((row) => row.map((value, driver) => value - (point[driver] ?? 0)));
  const distance = Math.sqrt(nearestToOrigin(from));
  return computed(distance < 1e-9 ? 0 : distance);
}

/** Squared length of the shortest mixture of the points, by Wolfe's method: a corral of points grows until no point helps. */
function nearestToOrigin(points: readonly (readonly number[])[]): number {
  const lengths = points.map((point) => dot(point, point));
  const slack = 1e-13 * Math.max(...lengths, 1);
  let corral = [lengths.indexOf(Math.min(...lengths))];
  let weights = [1];
  let nearest = mixture({ points, corral, weights });
  // Each round shortens the mixture, and there are finitely many corrals; the bound only guards against rounding.
  for (let round = 0; round < 1000; round++) {
    const along = points.map((point) => dot(point, nearest));
    const next = along.indexOf(Math.min(...along));
    if (dot(nearest, nearest) - (along[next] ?? 0) <= slack || corral.includes(next)) break;
    corral = [...corral, next];
    weights = [...weights, 0];
    for (;;) {
      const wanted = flatNearest(corral.map((index) => points[index] ?? []));
      if (wanted.every((weight) => weight > 1e-14)) {
        weights = wanted;
        break;
      }
      const steps = wanted.map((weight, index) => {
        const now = weights[index] ?? 0;
        if (weight > 1e-14) return Number.POSITIVE_INFINITY;
        return now === 0 ? 0 : now / (now - weight);
      });
      const step = Math.min(...steps);
      const moved = weights.map((weight, index) => weight + step * ((wanted[index] ?? 0) - weight));
      const leaves = steps.indexOf(step);
      const stays = (_: number, index: number) => index !== leaves && (moved[index] ?? 0) > 1e-14;
      corral = corral.filter(stays);
      weights = moved.filter(stays);
      if (corral.length <= 1) {
        weights = [1];
        break;
      }
    }
    nearest = mixture({ points, corral, weights });
  }
  return dot(nearest, nearest);
}

/** Weights of the point nearest to the origin in the flat through the points: (G + 1) u = 1, scaled to sum 1. */
function flatNearest(points: readonly (readonly number[])[]): number[] {
  const rows = points.map((a) => [...points.map((b) => dot(a, b) + 1), 1]);
  for (let column = 0; column < rows.length; column++) {
    const pivot = rows
      .slice(column)
      .reduce((best, row) => (Math.abs(row[column] ?? 0) > Math.abs(best[column] ?? 0) ? row : best));
    rows.splice(rows.indexOf(pivot), 1);
    rows.splice(column, 0, pivot);
    for (const row of rows) {
      if (row === pivot) continue;
      const factor = (row[column] ?? 0) / (pivot[column] ?? 1);
      for (let index = column; index < row.length; index++)
        row[index] = (row[index] ?? 0) - factor * (pivot[index] ?? 0);
    }
  }
  const solved = rows.map((row, index) => (row.at(-1) ?? 0) / (row[index] ?? 1));
  const sum = solved.reduce((so, weight) => so + weight, 0);
  return solved.map((weight) => weight / sum);
}

function mixture(of: {
  readonly points: readonly (readonly number[])[];
  readonly corral: readonly number[];
  readonly weights: readonly number[];
}): number[] {
  return (of.points[0] ?? []).map((_, driver) =>
    of.corral.reduce(
      (sum, index, place) => sum + (of.weights[place] ?? 0) * (of.points[index]?.[driver] ?? 0),
      0,
    ),
  );
}

function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((sum, value, index) => sum + value * (b[index] ?? 0), 0);
}
