import { defined, type Statistic, undefinedBecause } from '../paired.ts';
import { type Rating, ratings } from '../tables/performance-ratings.ts';

/**
 * Overall class of several scores of one series.
 *
 * Formula: the lowest of the classes
 * Inputs: the classes of the single scores.
 * Range: the four classes.
 * Read: conflicting ratings are to be described conservatively; state each score's own class beside it.
 * Undefined: no classes.
 * Source: Moriasi et al. 2007, Trans. ASABE 50(3):885-900, p. 895.
 * Example: lowestRating(['very good', 'satisfactory', 'good']) -> {value: 'satisfactory'}
 */
export function lowestRating(given: readonly Rating[]): Statistic<Rating> {
  const lowest = ratings.findLast((rating) => given.includes(rating));
  return lowest ? defined(lowest) : undefinedBecause('no score was rated');
}
