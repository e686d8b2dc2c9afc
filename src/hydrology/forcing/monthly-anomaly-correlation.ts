import { correlation } from '../fit/correlation.ts';
import { isDefined, type Paired, type Statistic, undefinedBecause } from '../paired.ts';
import { calendarMonth } from '../season/calendar-month.ts';
import { climatology } from '../season/climatology.ts';

/**
 * Correlation of two rainfall series' monthly totals with the season taken out.
 *
 * Formula: r of O_t - mean O of its calendar month and S_t - mean S of its calendar month
 * Inputs: pairs of totals of complete months, the reference as observed, the checked series as simulated.
 * Range: -1 to 1; best 1.
 * Read: raw monthly totals correlate by their shared season even when the wet years are the wrong ones; anomalies do not.
 * Undefined: a calendar month without pair, fewer than two years, or anomalies all equal.
 * Source: common practice; no published limit is known.
 * Example: monthlyAnomalyCorrelation(pairInOrder({observed: [1], simulated: [2]})) -> {undefined: 'no pair falls in month 2'}
 */
export function monthlyAnomalyCorrelation(monthly: Paired): Statistic {
  const season = climatology(monthly);
  if (!isDefined(season)) return season;
  const { observed, simulated } = season.value;
  if (monthly.observed.length === 12)
    return undefinedBecause('one year has no anomalies: each month is its own mean');
  const months = monthly.times.map(calendarMonth);
  const anomaly = (means: Float64Array) => (value: number, index: number) =>
    value - (means[months[index] ?? 0] ?? 0);
  return correlation({
    ...monthly,
    observed: monthly.observed.map(anomaly(observed)),
    simulated: monthly.simulated.map(anomaly(simulated)),
  });
}
