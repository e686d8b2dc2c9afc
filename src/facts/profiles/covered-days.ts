import type { Combine } from '../../manifest/data.generated.ts';
import { dateOf, secondsOfDay, type Window } from '../../series/calendar.ts';
import { daysOfYear, type YearBegins } from '../../series/hydrological-year.ts';
import { afterSteps, isByDate, type Step } from '../../series/step.ts';
import type { FileProfile } from './file-profile.ts';

/**
 * The days from the first to the last row, both included; null without rows. A monthly or yearly value covers its month or
 * year. Steps below a day that begin after midnight and end at midnight are labelled by their end.
 */
export function coveredDays(
  { firstSeconds, lastSeconds }: FileProfile,
  step: Step | null,
  yearBegins: YearBegins,
): Window | null {
  if (firstSeconds === null || lastSeconds === null) return null;
  const isShort = step?.kind === 'seconds' && step.length < secondsOfDay;
  const byEnd = isShort && firstSeconds % secondsOfDay !== 0 && lastSeconds % secondsOfDay === 0;
  const { firstDay } = daysOfStep(firstSeconds, step, yearBegins);
  const { lastDay } = daysOfStep(lastSeconds, step, yearBegins);
  return { firstDay, lastDay: byEnd ? lastDay - 1 : lastDay };
}

function daysOfStep(seconds: number, step: Step | null, yearBegins: YearBegins): Window {
  const day = Math.floor(seconds / secondsOfDay);
  if (step === null || !isByDate(step)) return { firstDay: day, lastDay: day };
  if (step.kind === 'months' && step.length === 12) return daysOfYear(dateOf(day).year, yearBegins);
  return { firstDay: day, lastDay: Math.floor(afterSteps(seconds, 1, step) / secondsOfDay) - 1 };
}

/**
 * The days that several files cover together: of a mean, a sum or a weighted mean those that all of them cover, since it has a
 * value only there; else from the first to the last of all. Null where there are none.
 */
export function coveredTogether(files: readonly Window[], how: Combine | undefined): Window | null {
  if (files.length === 0) return null;
  const everyFile = how !== undefined && how !== 'each';
  const [begin, end] = everyFile ? [Math.max, Math.min] : [Math.min, Math.max];
  const firstDay = begin(...files.map((file) => file.firstDay));
  const lastDay = end(...files.map((file) => file.lastDay));
  return firstDay <= lastDay ? { firstDay, lastDay } : null;
}
