import { computed, type Statistic, undefinedBecause } from '../paired.ts';

/**
 * Warm-up that a linear store needs until its wrong initial content is forgotten.
 *
 * Formula: smallest whole number of days t with exp(-t / k) at or below the remaining share: k ln(1 / share), rounded up
 * Inputs: store constant k in days; share of the initial error that may remain, such as 0.01.
 * Range: 0 days upwards.
 * Read: to 1 % it takes 4.6 k: a groundwater store of 120 days needs 553 days, so that one year is not enough.
 * Undefined: a store constant or a share that is not above 0.
 * Source: algebra of the linear store; average needs of real catchments: Rahman & Lu 2015, Water 7(8):4256-4273.
 * Example: linearStoreDays({storeConstantDays: 45, remainingShare: 0.01}) -> {value: 208}
 */
export function linearStoreDays(of: {
  readonly storeConstantDays: number;
  readonly remainingShare: number;
}): Statistic {
  if (!(of.storeConstantDays > 0 && of.remainingShare > 0))
    return undefinedBecause('a store constant and a remaining share are above zero');
  return computed(Math.max(0, Math.ceil(of.storeConstantDays * Math.log(1 / of.remainingShare))));
}
