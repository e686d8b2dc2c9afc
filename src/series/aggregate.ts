import { defined, isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import {
  dayNumber,
  firstDayOfMonth,
  formatDate,
  monthNumber,
  secondsOfDay,
  type Window,
} from './calendar.ts';
import { calendarYears, daysOfYear, type YearBegins, yearOf } from './hydrological-year.ts';
import type { Series } from './series.ts';
import { afterSteps, daily, monthly, type Step, stepsBetween, yearly } from './step.ts';
import { isInMonths } from './within.ts';

/**
 * When what is there is enough for a value:
 * - `every-step`: nothing is missing. WMO's rule for totals, and the strict rule for means.
 * - `three-five`: at most 3 in a row and at most 5 in all are missing; WMO's older rule for monthly means of daily values.
 * - `eleven-five`: fewer than 5 in a row and fewer than 11 in all are missing; WMO-No. 1203 (2017), for the same (from memory).
 * - `any`: one value suffices; for samples.
 */
export type Completeness = 'every-step' | 'three-five' | 'eleven-five' | 'any';

export interface Aggregation {
  readonly by: 'day' | 'month' | 'year';
  /** `total` adds the values as they stand: turn a rate into an amount for each step first (`convertSeries`). */
  readonly how: 'total' | 'mean';
  readonly completeness: Completeness;
  /** Calendar years unless stated. */
  readonly yearBegins?: YearBegins;
  /** First and last month that count, both included; `[11, 2]` goes over the turn of the year. All unless stated. */
  readonly months?: readonly [number, number];
}

/** One day, month or year of a series. */
export interface Group {
  /** `2013`, `2013-02` or `2013-02-28`; a year is named by the calendar year in which it ends. */
  readonly label: string;
  readonly days: Window;
  /** Steps that it would hold if nothing were missing; for irregular series those that there are. */
  readonly steps: number;
  readonly missing: number;
  /** Most steps missing in a row. */
  readonly longestGap: number;
  /** Sum of the values that are there, whatever is missing. */
  readonly presentSum: number;
  readonly value: Statistic;
}

/**
 * A series by day, month or year, from the group that holds its first row to the one that holds its last. Steps before the first
 * row and after the last are missing like all others, so a record that begins within a year has no value for that year.
 */
export function aggregate(series: Series, aggregation: Aggregation): readonly Group[] {
  const { by, yearBegins = calendarYears } = aggregation;
  const { timeSeconds } = series;
  const rows = timeSeconds.length;
  if (rows === 0) return [];
  const dayOf = (row: number) => Math.floor((timeSeconds[row] as number) / secondsOfDay);
  const groupOf = (day: number) =>
    by === 'day' ? day : by === 'month' ? monthNumber(day) : yearOf(day, yearBegins);
  const last = groupOf(dayOf(rows - 1));
  const groups: Group[] = [];
  let row = 0;
  for (let group = groupOf(dayOf(0)); group <= last; group++) {
    const days = daysOf(group, by, yearBegins);
    const count = new Count(aggregation.months);
    row = countSteps(series, days, row, count);
    groups.push({ label: labelOf(group, by), days, ...count.outcome(aggregation) });
  }
  return groups;
}

/** The same as a series, each value at its day, the first of its month or 1 January of the year that names it; missing where it is undefined. */
export function aggregated(series: Series, aggregation: Aggregation): Series {
  const groups = aggregate(series, aggregation);
  const steps = { day: daily, month: monthly, year: yearly } satisfies Record<Aggregation['by'], Step>;
  const startsOn = ({ label, days }: Group) =>
    aggregation.by === 'year' ? dayNumber(Number(label), 1, 1) : days.firstDay;
  return {
    unit: series.unit,
    step: steps[aggregation.by],
    timeSeconds: Float64Array.from(groups, (group) => startsOn(group) * secondsOfDay),
    values: Float64Array.from(groups, ({ value }) => (isDefined(value) ? value.value : Number.NaN)),
  };
}

function daysOf(group: number, by: Aggregation['by'], yearBegins: YearBegins): Window {
  if (by === 'day') return { firstDay: group, lastDay: group };
  if (by === 'year') return daysOfYear(group, yearBegins);
  return { firstDay: firstDayOfMonth(group), lastDay: firstDayOfMonth(group + 1) - 1 };
}

function labelOf(group: number, by: Aggregation['by']): string {
  if (by === 'day') return formatDate(group);
  return by === 'year' ? String(group).padStart(4, '0') : formatDate(firstDayOfMonth(group)).slice(0, 7);
}

/** Counts the steps of some days, from the row `from` on; the first row after them. */
function countSteps(series: Series, days: Window, from: number, count: Count): number {
  const { timeSeconds, values, step } = series;
  const until = (days.lastDay + 1) * secondsOfDay;
  let row = from;
  if (step.kind === 'irregular') {
    for (; row < timeSeconds.length && (timeSeconds[row] as number) < until; row++)
      count.step(timeSeconds[row] as number, values[row] as number);
    return row;
  }
  const origin = timeSeconds[0] as number;
  const begins = days.firstDay * secondsOfDay;
  let place = Math.floor(stepsBetween(origin, begins, step));
  while (afterSteps(origin, place, step) < begins) place++;
  for (let time = afterSteps(origin, place, step); time < until; time = afterSteps(origin, ++place, step)) {
    while (row < timeSeconds.length && (timeSeconds[row] as number) < time) row++;
    count.step(time, timeSeconds[row] === time ? (values[row] as number) : Number.NaN);
  }
  return row;
}

/** What one group holds. */
class Count {
  private steps = 0;
  private missing = 0;
  private gap = 0;
  private longestGap = 0;
  private presentSum = 0;
  private readonly months: readonly [number, number] | undefined;

  constructor(months: readonly [number, number] | undefined) {
    this.months = months;
  }

  step(timeSeconds: number, value: number): void {
    if (this.months !== undefined && !isInMonths(timeSeconds, this.months)) return;
    this.steps++;
    if (Number.isNaN(value)) {
      this.missing++;
      this.longestGap = Math.max(this.longestGap, ++this.gap);
    } else {
      this.gap = 0;
      this.presentSum += value;
    }
  }

  outcome({ how, completeness }: Aggregation): Omit<Group, 'label' | 'days'> {
    const { steps, missing, longestGap, presentSum } = this;
    const present = steps - missing;
    const lacking = this.lacking(completeness);
    const value =
      lacking === null
        ? defined(how === 'total' ? presentSum : presentSum / present)
        : undefinedBecause(lacking);
    return { steps, missing, longestGap, presentSum, value };
  }

  /** Why there is no value; null where there is one. */
  private lacking(completeness: Completeness): string | null {
    const { steps, missing, longestGap } = this;
    if (steps === missing) return 'no value is there';
    const enough = {
      'every-step': missing === 0,
      'three-five': missing <= 5 && longestGap <= 3,
      'eleven-five': missing < 11 && longestGap < 5,
      any: true,
    };
    if (enough[completeness]) return null;
    return `${steps - missing} of ${steps} values are there, and ${longestGap} in a row are missing`;
  }
}
