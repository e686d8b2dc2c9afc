import { firstDayOfMonth, monthNumber, secondsOfDay, type Window } from './calendar.ts';
import { daysOfYear, type YearBegins, yearOf } from './hydrological-year.ts';
import { isByDate, type Step, stepsBetween } from './step.ts';

/** A span from a time up to, not including, another. */
export interface Span {
  readonly fromSeconds: number;
  readonly untilSeconds: number;
}

/** The days of any of the windows but none of `leftOut`, as spans in order that neither touch nor overlap. */
export function spansOf(windows: readonly Window[], leftOut: readonly Window[]): readonly Span[] {
  const inOrder = windows.toSorted((one, other) => one.firstDay - other.firstDay);
  let days: Window[] = [];
  for (const window of inOrder) {
    const before = days.at(-1);
    if (before === undefined || window.firstDay > before.lastDay + 1) days.push(window);
    else days[days.length - 1] = { ...before, lastDay: Math.max(before.lastDay, window.lastDay) };
  }
  for (const out of leftOut)
    days = days.flatMap((window) =>
      [
        { firstDay: window.firstDay, lastDay: Math.min(window.lastDay, out.firstDay - 1) },
        { firstDay: Math.max(window.firstDay, out.lastDay + 1), lastDay: window.lastDay },
      ].filter((rest) => rest.firstDay <= rest.lastDay),
    );
  return days.map(({ firstDay, lastDay }) => ({
    fromSeconds: firstDay * secondsOfDay,
    untilSeconds: (lastDay + 1) * secondsOfDay,
  }));
}

/**
 * Where the steps start that belong to whole days. Daily and longer steps belong to days that hold all of them, years as they begin;
 * shorter steps and samples go by their time alone, since files label them by their start or by their end.
 */
export function startsIn(days: Span, step: Step, yearBegins: YearBegins): Span {
  const { fromSeconds, untilSeconds } = days;
  if (step.kind === 'seconds' && isByDate(step))
    return { fromSeconds, untilSeconds: untilSeconds - step.length + 1 };
  if (step.kind !== 'months') return days;
  const firstDay = fromSeconds / secondsOfDay;
  const nextDay = untilSeconds / secondsOfDay;
  if (step.length === 12) {
    const year = yearOf(firstDay, yearBegins);
    const begun = daysOfYear(year, yearBegins).firstDay < firstDay;
    return between((begun ? year + 1 : year) * 12, yearOf(nextDay, yearBegins) * 12);
  }
  const month = monthNumber(firstDay);
  const begun = firstDayOfMonth(month) < firstDay;
  return between(begun ? month + 1 : month, monthNumber(nextDay) - step.length + 1);
}

/** How many steps of a grid through `origin` start in a span; none in irregular series. */
export function countStarts(span: Span, origin: number, step: Step): number {
  if (step.kind === 'irregular') return 0;
  const { fromSeconds, untilSeconds } = span;
  const first = Math.ceil(stepsBetween(origin, fromSeconds, step));
  return Math.max(0, Math.ceil(stepsBetween(origin, untilSeconds, step)) - first);
}

function between(month: number, untilMonth: number): Span {
  return {
    fromSeconds: firstDayOfMonth(month) * secondsOfDay,
    untilSeconds: firstDayOfMonth(untilMonth) * secondsOfDay,
  };
}
