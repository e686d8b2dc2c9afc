import { dateOf, secondsOfDay } from './calendar.ts';
import { daysOfYear, type YearBegins } from './hydrological-year.ts';
import { afterSteps, isByDate, type Step, stepsBetween } from './step.ts';
import type { Span } from './windows.ts';

/**
 * What a step at a time stands for. Daily and longer steps reach to the next one, and years as they begin; shorter steps and
 * samples count by their time alone, since files label them by their start or by their end.
 */
export function extentOf(timeSeconds: number, step: Step, yearBegins: YearBegins): Span {
  if (!isByDate(step)) return { fromSeconds: timeSeconds, untilSeconds: timeSeconds + 1 };
  if (step.kind !== 'months' || step.length !== 12)
    return { fromSeconds: timeSeconds, untilSeconds: afterSteps(timeSeconds, 1, step) };
  const { firstDay, lastDay } = daysOfYear(dateOf(Math.floor(timeSeconds / secondsOfDay)).year, yearBegins);
  return { fromSeconds: firstDay * secondsOfDay, untilSeconds: (lastDay + 1) * secondsOfDay };
}

export function holds(span: Span, part: Span): boolean {
  return span.fromSeconds <= part.fromSeconds && part.untilSeconds <= span.untilSeconds;
}

/** How many steps of a grid through `origin` a span holds; none for irregular series. */
export function stepsIn(span: Span, origin: number, step: Step, yearBegins: YearBegins): number {
  const { fromSeconds, untilSeconds } = span;
  if (step.kind === 'irregular') return 0;
  if (step.kind === 'seconds') {
    const first = Math.ceil((fromSeconds - origin) / step.length);
    const until = (untilSeconds - origin) / step.length;
    return Math.max(0, (isByDate(step) ? Math.floor(until) : Math.ceil(until)) - first);
  }
  const first = Math.floor(stepsBetween(origin, fromSeconds, step)) - 1;
  const last = Math.ceil(stepsBetween(origin, untilSeconds, step)) + 1;
  let steps = 0;
  for (let place = first; place <= last; place++)
    if (holds(span, extentOf(afterSteps(origin, place, step), step, yearBegins))) steps++;
  return steps;
}
