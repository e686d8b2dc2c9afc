import { dateOf, dayNumber, isDate, type Window } from './calendar.ts';

/** The day on which years begin; 29 February is none. */
export interface YearBegins {
  readonly month: number;
  readonly day: number;
}

export const calendarYears: YearBegins = { month: 1, day: 1 };

/** A day written `10-01`; null for other text or a day that not every year has. */
export function parseYearBegins(text: string): YearBegins | null {
  const parts = /^(\d{2})-(\d{2})$/.exec(text);
  const [month, day] = [Number(parts?.[1]), Number(parts?.[2])];
  return parts !== null && isDate(2001, month, day) ? { month, day } : null;
}

/** The year that holds a day, named by the calendar year in which it ends (USGS usage: water year 2013 began in October 2012). */
export function yearOf(day: number, begins: YearBegins): number {
  const date = dateOf(day);
  if (begins.month === 1 && begins.day === 1) return date.year;
  const hasBegun = date.month > begins.month || (date.month === begins.month && date.day >= begins.day);
  return hasBegun ? date.year + 1 : date.year;
}

/** First and last day of a year named as by `yearOf`. */
export function daysOfYear(year: number, begins: YearBegins): Window {
  const startsIn = begins.month === 1 && begins.day === 1 ? year : year - 1;
  return {
    firstDay: dayNumber(startsIn, begins.month, begins.day),
    lastDay: dayNumber(startsIn + 1, begins.month, begins.day) - 1,
  };
}
