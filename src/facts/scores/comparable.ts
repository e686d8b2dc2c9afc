import { defined, isDefined, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import { type Aggregation, aggregated, type Completeness } from '../../series/aggregate.ts';
import { secondsOfDay } from '../../series/calendar.ts';
import { convertSeries } from '../../series/convert-series.ts';
import type { YearBegins } from '../../series/hydrological-year.ts';
import type { Series } from '../../series/series.ts';
import { formatStep, type Step, sameStep } from '../../series/step.ts';
import { parseUnit } from '../../series/units/parse-unit.ts';

/** Two series of one quantity, as they are read. */
export interface Sides {
  readonly observed: Series;
  readonly simulated: Series;
}

/** How two series are brought together. */
export interface Comparison {
  /** `streamflow`, `leaf_area`: says whether a value without a time in its unit is an amount for each step. */
  readonly variable: string;
  /** Null where nothing is stated: then the coarser of both. */
  readonly step: Step | null;
  /** To go between a flow and a depth. */
  readonly areaKm2?: number;
  readonly yearBegins: YearBegins;
  /** Counts months and years from which days are missing, too. */
  readonly incomplete?: boolean;
}

/**
 * Both series in the unit of the observations and in the step of the comparison. Finer series are added up where their
 * values are amounts (mm, kg), else averaged: totals need every step; a mean of days or hours over a month or year may lack 5, and
 * 3 in a row (WMO's older rule); a mean over a day needs all. Irregular samples stay as they are, but for months and years.
 * Undefined: a step finer than the data, units that don't fit.
 */
export function comparable(sides: Sides, comparison: Comparison): Statistic<Sides> {
  const { observed, simulated } = sides;
  const step = comparison.step ?? coarser(observed.step, simulated.step);
  const seen = atStep(observed, step, comparison);
  if (!isDefined(seen)) return undefinedBecause(`the observed series: ${seen.undefined}`);
  const made = inUnitAndStep(simulated, observed.unit, step, comparison);
  if (!isDefined(made)) return undefinedBecause(`the simulated series: ${made.undefined}`);
  return defined({ observed: seen.value, simulated: made.value });
}

/** A series in another unit and step; undefined where either does not fit. */
export function inUnitAndStep(
  series: Series,
  unit: string,
  step: Step,
  comparison: Comparison,
): Statistic<Series> {
  const first = convertSeries(series, unit, comparison);
  const made = atStep(isDefined(first) ? first.value : series, step, comparison);
  if (isDefined(first) || !isDefined(made)) return made;
  // mm a month can be made only of what stands by the month.
  const later = convertSeries(made.value, unit, comparison);
  return isDefined(later) ? later : first;
}

function coarser(one: Step, other: Step): Step {
  if (one.kind === 'irregular') return other;
  return length(one) >= length(other) ? one : other;
}

/** In seconds, a month counted as 30 days; for telling finer from coarser. */
function length(step: Step): number {
  if (step.kind === 'irregular') return 0;
  return step.kind === 'months' ? step.length * 30 * secondsOfDay : step.length;
}

/** One series in a step that is no finer than its own. */
export function atStep(
  series: Series,
  step: Step,
  comparison: Pick<Comparison, 'variable' | 'yearBegins' | 'incomplete'>,
): Statistic<Series> {
  if (sameStep(series.step, step) || step.kind === 'irregular') return defined(series);
  const by = periodOf(step);
  const isSampled = series.step.kind === 'irregular';
  if (isSampled && by !== 'month' && by !== 'year') return defined(series);
  if (length(series.step) >= length(step))
    return undefinedBecause(
      `its step is ${formatStep(series.step)}, so it has no values of ${formatStep(step)}`,
    );
  if (by === null)
    return undefinedBecause(
      `values of ${formatStep(series.step)} can't be brought to ${formatStep(step)}; days, months and years can`,
    );
  const how = isAmount(comparison.variable, series.unit) ? 'total' : 'mean';
  const { yearBegins, incomplete = false } = comparison;
  const completeness: Completeness =
    isSampled || incomplete ? 'any' : how === 'total' || by === 'day' ? 'every-step' : 'three-five';
  return defined(aggregated(series, { by, how, completeness, yearBegins }));
}

function periodOf(step: Step): Aggregation['by'] | null {
  if (step.kind === 'seconds') return step.length === secondsOfDay ? 'day' : null;
  if (step.kind === 'irregular') return null;
  return step.length === 1 ? 'month' : step.length === 12 ? 'year' : null;
}

/** What flows, so that a value in mm or kg is an amount for its step; a store in mm is none. */
const flowing: ReadonlySet<string> = new Set([
  'precipitation',
  'streamflow',
  'evapotranspiration',
  'irrigation',
  'sediment',
  'nitrogen',
  'phosphorus',
]);

function isAmount(variable: string, unit: string): boolean {
  const parsed = parseUnit(unit);
  if (!flowing.has(variable) || !isDefined(parsed)) return false;
  const [length, mass, time, , , amount, , month] = parsed.value.dimension;
  const isConcentration = (mass !== 0 || amount !== 0) && length === -3;
  const isShare = length === 0 && mass === 0 && amount === 0;
  return time === 0 && month === 0 && !isConcentration && !isShare;
}
