import { dateOf, secondsOfDay, type Window } from './calendar.ts';
import type { YearBegins } from './hydrological-year.ts';
import type { Series } from './series.ts';
import { spansOf, startsIn } from './windows.ts';

/** Which rows of a series count. */
export interface Within {
  /** Days, any of them; a step that reaches beyond them does not count. */
  readonly windows: readonly Window[];
  readonly leftOut?: readonly Window[];
  readonly yearBegins: YearBegins;
  /** First and last month, both included; `[11, 2]` goes over the turn of the year. All unless stated. */
  readonly months?: readonly [number, number] | undefined;
}

/** The rows of a series that lie in some days of some months. */
export function within(series: Series, { windows, leftOut = [], yearBegins, months }: Within): Series {
  const { timeSeconds, values, step } = series;
  const spans = spansOf(windows, leftOut).map((days) => startsIn(days, step, yearBegins));
  const kept: number[] = [];
  let next = 0;
  for (const [row, time] of timeSeconds.entries()) {
    while (time >= (spans[next]?.untilSeconds ?? Number.POSITIVE_INFINITY)) next++;
    const isInside = time >= (spans[next]?.fromSeconds ?? Number.POSITIVE_INFINITY);
    if (isInside && (months === undefined || isInMonths(time, months))) kept.push(row);
  }
  return {
    ...series,
    timeSeconds: Float64Array.from(kept, (row) => timeSeconds[row] as number),
    values: Float64Array.from(kept, (row) => values[row] as number),
  };
}

export function isInMonths(timeSeconds: number, [first, last]: readonly [number, number]): boolean {
  const { month } = dateOf(Math.floor(timeSeconds / secondsOfDay));
  return first <= last ? month >= first && month <= last : month >= first || month <= last;
}
