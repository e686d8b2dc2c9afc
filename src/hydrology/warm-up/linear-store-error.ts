import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * What is left of a wrong initial content of a linear store after some days.
 *
 * Formula: initial error exp(-t / k)
 * Inputs: store constant k and time t in days; initial error in any unit, such as mm; the result is in that unit.
 * Range: towards 0.
 * Read: compare with the store's usual content at the first day that is scored.
 * Undefined: a store constant that is not above 0.
 * Source: algebra of the linear store.
 * Example: linearStoreError({storeConstantDays: 45, initialError: 80, days: 365}) -> {value: 0.024}
 */
export function linearStoreError(of: {
  readonly storeConstantDays: number;
  readonly initialError: number;
  readonly days: number;
}): Statistic {
  if (!(of.storeConstantDays > 0)) return undefinedBecause('a store constant is above zero');
  return computed(of.initialError * Math.exp(-of.days / of.storeConstantDays));
}
