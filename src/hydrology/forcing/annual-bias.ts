import { percentBias } from '../fit/percent-bias.ts';
import { computed, isDefined, type Paired, type Statistic, undefinedBecause } from '../paired.ts';

export interface AnnualBias {
  readonly totalPercent: Statistic;
  /** Year by year, in the order of the pairs. */
  readonly yearsPercent: readonly Statistic[];
}

/**
 * Bias of a rainfall series against its reference, in total and year by year.
 *
 * Formula: 100 (S - O) / O, of the sums and of each year
 * Inputs: pairs of totals of complete years, the reference as observed, the checked series as simulated; one unit.
 * Range: -100 upwards; best 0; in percent.
 * Read: positive = the checked series is too wet: the opposite sign of PBIAS.
 * Undefined: each figure: a reference of zero.
 * Source: definition; no published limit is known.
 * Example: annualBias(pairInOrder({observed: [1000, 800], simulated: [900, 900]})) -> {totalPercent: {value: 0}, yearsPercent: [{value: -10}, {value: 12.5}]}
 */
export function annualBias(years: Paired): AnnualBias {
  const lacking = percentBias(years);
  return {
    totalPercent: isDefined(lacking) ? computed(0 - lacking.value) : lacking,
    yearsPercent: Array.from(years.observed, (reference, index) =>
      reference === 0
        ? undefinedBecause('the reference has no rain in that year')
        : computed((100 * ((years.simulated[index] ?? 0) - reference)) / reference),
    ),
  };
}
