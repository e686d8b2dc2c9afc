import { defined, isDefined, type Statistic, undefinedBecause } from '../paired.ts';
import { yearlyChange } from './yearly-change.ts';

/**
 * First year from which a store no longer drifts.
 *
 * Formula: smallest year i such that every |change| into year i and later ones stays below the limit
 * Inputs: the store on the same date of each year, or its annual means, in order; limit in percent a year.
 * Range: 2 upwards, years counted from 1.
 * Read: the years before it belong to the warm-up. A drying climate drifts too: compare with the rainfall.
 * Undefined: not reached; fewer than two years.
 * Source: Ajami et al. 2014, Water Resour. Res. 50:2636-2656 (limits from memory).
 * Example: settledYear({storage: [210, 318, 366.5, 367, 367.1], limitPercent: 1}) -> {value: 4}
 */
export function settledYear(of: {
  readonly storage: ArrayLike<number>;
  readonly limitPercent: number;
}): Statistic {
  const changes = yearlyChange(of.storage);
  const moving = changes.findLastIndex(
    (change) => !isDefined(change) || Math.abs(change.value) >= of.limitPercent,
  );
  if (moving === changes.length - 1)
    return undefinedBecause(`the store still changes by ${of.limitPercent} % a year or more at the end`);
  return defined(moving + 3);
}
