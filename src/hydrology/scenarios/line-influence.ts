import { mean, squaredDeviations } from '../arithmetic.ts';
import { defined, type Statistic, undefinedBecause } from '../paired.ts';

export interface Influence {
  readonly leverage: number;
  /** Error over its own standard deviation (internally studentized). */
  readonly studentizedError: number;
  /** Cook's distance. */
  readonly cooksDistance: number;
}

/**
 * How much single points pull a straight line, such as that of a rating or a double mass.
 *
 * Formula: h = 1 / n + (x - mean x)^2 / sum((x - mean x)^2); r = e / sqrt(MSE (1 - h)); D = r^2 h / (p (1 - h)), p = 2
 * Inputs: x and y, step beside step, any units.
 * Range: leverage 1 / n to 1; Cook's distance 0 upwards.
 * Read: leverage above 3 p / n is a warning; Cook's distance above 1 moves the line (from memory).
 * Undefined: fewer than three points, x all equal, points all on the line, or all but one at one x.
 * Source: Cook 1977, Technometrics 19:15-18 (from memory).
 * Example: lineInfluence({x: [1, 2, 3], y: [1, 3, 2]}) -> {value: [{leverage: 0.8333, studentizedError: -1, cooksDistance: 2.5}, {leverage: 0.3333, studentizedError: 1, cooksDistance: 0.25}, {leverage: 0.8333, studentizedError: -1, cooksDistance: 2.5}]}
 */
export function lineInfluence(of: {
  readonly x: ArrayLike<number>;
  readonly y: ArrayLike<number>;
}): Statistic<readonly Influence[]> {
  const n = of.x.length;
  if (n < 3) return undefinedBecause('influence needs at least three points');
  const squares = squaredDeviations(of.x);
  if (squares === 0) return undefinedBecause('the points have one x, so no line is fixed');
  const [xMean, yMean] = [mean(of.x), mean(of.y)];
  const x = Array.from(of.x, (value) => value - xMean);
  const y = Array.from(of.y, (value) => value - yMean);
  const gradient = x.reduce((sum, value, index) => sum + value * (y[index] ?? 0), 0) / squares;
  const errors = y.map((value, index) => value - gradient * (x[index] ?? 0));
  const variance = errors.reduce((sum, error) => sum + error * error, 0) / (n - 2);
  if (!(variance > 1e-24 * squaredDeviations(of.y)))
    return undefinedBecause('the points all lie on the line');
  const leverages = x.map((value) => 1 / n + value ** 2 / squares);
  if (Math.max(...leverages) > 1 - 1e-12) return undefinedBecause('one point alone decides the gradient');
  return defined(
    leverages.map((leverage, index) => {
      const studentizedError = (errors[index] ?? 0) / Math.sqrt(variance * (1 - leverage));
      const cooksDistance = (studentizedError ** 2 * leverage) / (2 * (1 - leverage));
      return { leverage, studentizedError, cooksDistance };
    }),
  );
}
