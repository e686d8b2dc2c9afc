import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * Change of a store from each year to the next.
 *
 * Formula: 100 (X_i+1 - X_i) / X_i
 * Inputs: the store on the same date of each year, or its annual means, in order; in percent of the year before.
 * Range: any; 0 when settled.
 * Read: spun up when all later changes stay below 1, 0.1 or 0.01 %; which one depends on the use.
 * Undefined: single changes from an empty store; an empty list for under two years.
 * Source: Ajami et al. 2014, Water Resour. Res. 50:2636-2656 (limits from memory).
 * Example: yearlyChange([210, 318]) -> [{value: 51.4286}]
 */
export function yearlyChange(storage: ArrayLike<number>): Statistic[] {
  return Array.from({ length: Math.max(0, storage.length - 1) }, (_, index) => {
    const before = storage[index] ?? 0;
    if (before === 0) return undefinedBecause('the store was empty the year before');
    return computed((100 * ((storage[index + 1] ?? 0) - before)) / before);
  });
}
