import { correlation } from '../../hydrology/fit/correlation.ts';
import { annualBias } from '../../hydrology/forcing/annual-bias.ts';
import { type DayShift, dayShift } from '../../hydrology/forcing/day-shift.ts';
import { type DoubleMass, doubleMass } from '../../hydrology/forcing/double-mass.ts';
import { monthlyAnomalyCorrelation } from '../../hydrology/forcing/monthly-anomaly-correlation.ts';
import { defined, isDefined, type Paired, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import { climatology } from '../../hydrology/season/climatology.ts';
import { aggregated } from '../../series/aggregate.ts';
import { secondsOfDay } from '../../series/calendar.ts';
import { convertSeries, type Over } from '../../series/convert-series.ts';
import type { YearBegins } from '../../series/hydrological-year.ts';
import { pairByDate } from '../../series/pair.ts';
import type { Series } from '../../series/series.ts';
import { daily, monthly, type Step, sameStep, yearly } from '../../series/step.ts';
import { asDepth } from './as-depth.ts';
import { commonTotals } from './common-totals.ts';

/** A series held against its reference, over the steps that both have. Undefined parts say why. JSON can say all of it. */
export interface Comparison {
  /** Steps that both have. */
  readonly pairs: number;
  /** Their totals, in mm where both give a depth, else sums in the checked series' unit; null where values do not add up. */
  readonly totals: { readonly checked: number; readonly reference: number } | null;
  /** Names of the years that both have, all but a tenth of the steps. */
  readonly years: readonly string[];
  readonly biasPercent: Statistic;
  readonly yearsBiasPercent: readonly Statistic[];
  readonly annualCorrelation: Statistic;
  /** Of the means of the twelve calendar months, and of what is left when they are taken away. */
  readonly seasonCorrelation: Statistic;
  readonly anomalyCorrelation: Statistic;
  /** Daily series only. */
  readonly dayShift: Statistic<DayShift>;
  readonly doubleMass: Statistic<DoubleMass>;
}

export interface ComparisonOf {
  readonly checked: Series;
  readonly reference: Series;
  readonly role: string;
  readonly yearBegins: YearBegins;
  readonly over: Over;
}

/** Raised whenever the same content may get another comparison. */
export const comparisonVersion = 1;

/** Fewer days than a year tell no shift from chance. */
const fewestDays = 365;

/** Undefined: units of different things, no step in common. */
export function comparisonOf({ role, yearBegins, over, ...series }: ComparisonOf): Statistic<Comparison> {
  const addsUp = role === 'precipitation' || role === 'evapotranspiration' || role === 'streamflow';
  const sides = (addsUp ? bothDepths(series, over) : null) ?? inOneUnit(series, over);
  if (!isDefined(sides)) return sides;
  const { checked, reference, how } = sides.value;
  const step = coarser(checked.step, reference.step);
  if (step === null) return undefinedBecause('one of the two has no regular step');
  const ends = [checked, reference].flatMap(({ timeSeconds: times }) => [times[0] ?? 0, times.at(-1) ?? 0]);
  const [firstDay, lastDay] = [Math.min(...ends), Math.max(...ends)].map((time) =>
    Math.floor(time / secondsOfDay),
  );
  const paired = pairByDate({
    observed: inStep(reference, step, how, yearBegins),
    simulated: inStep(checked, step, how, yearBegins),
    windows: [{ firstDay: (firstDay ?? 0) - 366, lastDay: (lastDay ?? 0) + 366 }],
    yearBegins,
  });
  if (!isDefined(paired)) return paired;
  const pairs = paired.value;
  if (pairs.observed.length === 0) return undefinedBecause('no step has a value in both');
  const grouped = (by: 'month' | 'year') =>
    commonTotals(pairs, { step, by, how: addsUp ? 'total' : 'mean', yearBegins });
  const years = grouped('year');
  const months = sameStep(step, yearly) ? null : grouped('month').pairs;
  const bias = annualBias(years.pairs);
  const noSum = undefinedBecause('values of this kind do not add up');
  const noMonths = undefinedBecause('yearly values hold no season');
  return defined({
    pairs: pairs.observed.length,
    totals: addsUp ? { checked: sum(pairs.simulated), reference: sum(pairs.observed) } : null,
    years: years.labels,
    biasPercent: addsUp ? bias.totalPercent : noSum,
    yearsBiasPercent: addsUp ? bias.yearsPercent : [],
    annualCorrelation: correlation(years.pairs),
    seasonCorrelation: months === null ? noMonths : seasonCorrelation(months),
    anomalyCorrelation: months === null ? noMonths : monthlyAnomalyCorrelation(months),
    dayShift: shift(pairs, step),
    doubleMass: addsUp
      ? doubleMass({
          years: years.labels.map(Number),
          pattern: years.pairs.observed,
          station: years.pairs.simulated,
        })
      : noSum,
  });
}

type Sides = Pick<ComparisonOf, 'checked' | 'reference'>;

/** How a side is brought to a longer step, besides the two. */
interface LikeSides extends Sides {
  readonly how: 'total' | 'mean';
}

/** Both as depths for each step, which add up; null where one has no depth. */
function bothDepths(sides: Sides, over: Over): Statistic<LikeSides> | null {
  const [checked, reference] = [asDepth(sides.checked, over), asDepth(sides.reference, over)];
  if (!isDefined(checked) || !isDefined(reference)) return null;
  return defined({ checked: checked.value, reference: reference.value, how: 'total' });
}

function inOneUnit({ checked, reference }: Sides, over: Over): Statistic<LikeSides> {
  const converted = convertSeries(reference, checked.unit, over);
  return isDefined(converted) ? defined({ checked, reference: converted.value, how: 'mean' }) : converted;
}

function sum(values: Float64Array): number {
  return values.reduce((one, other) => one + other, 0);
}

function shift(pairs: Paired, step: Step): Statistic<DayShift> {
  if (!sameStep(step, daily)) return undefinedBecause('only daily series show a shift of one day');
  if (pairs.observed.length < fewestDays)
    return undefinedBecause(`fewer than ${fewestDays} days have a value in both`);
  return dayShift(pairs);
}

function seasonCorrelation(months: Paired): Statistic {
  const season = climatology(months);
  return isDefined(season) ? correlation(season.value) : season;
}

/** The step to which both can be brought: the longer of the two, a day at least; null for irregular ones. */
function coarser(one: Step, other: Step): Step | null {
  if (one.kind === 'irregular' || other.kind === 'irregular') return null;
  if (sameStep(one, other)) return one;
  const longest = Math.max(...[one, other].map(roughSeconds));
  if (longest <= secondsOfDay) return daily;
  return longest <= 31 * secondsOfDay ? monthly : yearly;
}

function roughSeconds({ kind, length }: Exclude<Step, { kind: 'irregular' }>): number {
  return kind === 'months' ? length * 30 * secondsOfDay : length;
}

function inStep(series: Series, step: Step, how: 'total' | 'mean', yearBegins: YearBegins): Series {
  if (sameStep(series.step, step)) return series;
  const by = sameStep(step, daily) ? 'day' : sameStep(step, monthly) ? 'month' : 'year';
  return aggregated(series, { by, how, completeness: 'every-step', yearBegins });
}
