/**
 * Calendar arithmetic of ISO 8601 (Gregorian, also before 1582) on day numbers: days since 1970-01-01, which is 0.
 * Times below a day are seconds since 1970-01-01T00:00 on the clock of the station; no zone and no daylight saving.
 */

export const secondsOfDay = 86_400;

export interface CalendarDate {
  readonly year: number;
  /** 1 to 12. */
  readonly month: number;
  /** 1 to 31. */
  readonly day: number;
}

/** A span of whole days; both belong to it. */
export interface Window {
  readonly firstDay: number;
  readonly lastDay: number;
}

/** Every fourth year, but of the full centuries only every fourth: 2000 is a leap year, 1900 and 2100 are not. */
export function isLeapYear(year: number): boolean {
  return year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0);
}

const monthLengths = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

/** 28 to 31; 0 for a month that is not 1 to 12. */
export function daysInMonth(year: number, month: number): number {
  return month === 2 && isLeapYear(year) ? 29 : (monthLengths[month - 1] ?? 0);
}

/**
 * Days since 1970-01-01. The date must exist (see `isDate`).
 * Years are counted from March, so that the leap day is their last; 719468 is 1970-01-01 counted from 0000-03-01.
 */
export function dayNumber(year: number, month: number, day: number): number {
  const marchYear = month > 2 ? year : year - 1;
  const fromMarch = month > 2 ? month - 3 : month + 9;
  const leapDays = Math.floor(marchYear / 4) - Math.floor(marchYear / 100) + Math.floor(marchYear / 400);
  return marchYear * 365 + leapDays + Math.floor((153 * fromMarch + 2) / 5) + day - 1 - 719468;
}

/** The date of a day number; the reverse of `dayNumber`. */
export function dateOf(dayNumber: number): CalendarDate {
  const shifted = dayNumber + 719468;
  const cycle = Math.floor(shifted / 146097);
  const dayOfCycle = shifted - cycle * 146097;
  const yearOfCycle = Math.floor(
    (dayOfCycle -
      Math.floor(dayOfCycle / 1460) +
      Math.floor(dayOfCycle / 36524) -
      Math.floor(dayOfCycle / 146096)) /
      365,
  );
  const dayOfYear =
    dayOfCycle - (365 * yearOfCycle + Math.floor(yearOfCycle / 4) - Math.floor(yearOfCycle / 100));
  const fromMarch = Math.floor((5 * dayOfYear + 2) / 153);
  const month = fromMarch < 10 ? fromMarch + 3 : fromMarch - 9;
  return {
    year: yearOfCycle + cycle * 400 + (month <= 2 ? 1 : 0),
    month,
    day: dayOfYear - Math.floor((153 * fromMarch + 2) / 5) + 1,
  };
}

/** Whether the calendar has this date: not 2001-02-29, and no year before 1 or after 9999. */
export function isDate(year: number, month: number, day: number): boolean {
  return year >= 1 && year <= 9999 && day >= 1 && day <= daysInMonth(year, month);
}

/** Day number of an ISO date `YYYY-MM-DD`; null for any other text or a date that the calendar does not have. */
export function parseDate(text: string): number | null {
  const parts = /^(\d{4})-(\d{2})-(\d{2})$/.exec(text);
  if (parts === null) return null;
  const [year, month, day] = [Number(parts[1]), Number(parts[2]), Number(parts[3])];
  return isDate(year, month, day) ? dayNumber(year, month, day) : null;
}

/** A window written `first-day/last-day`; null unless both are dates in that order. */
export function parseWindow(text: string): Window | null {
  const [first, last, ...more] = text.split('/');
  if (first === undefined || last === undefined || more.length > 0) return null;
  const [firstDay, lastDay] = [parseDate(first), parseDate(last)];
  if (firstDay === null || lastDay === null || firstDay > lastDay) return null;
  return { firstDay, lastDay };
}

/** Days in a window, both ends included. */
export function windowDays(window: Window): number {
  return window.lastDay - window.firstDay + 1;
}

/** Months since year 0 of the month that holds a day: 12 x year + month - 1. */
export function monthNumber(day: number): number {
  const date = dateOf(day);
  return date.year * 12 + date.month - 1;
}

/** First day of a month counted as `monthNumber` does. */
export function firstDayOfMonth(monthNumber: number): number {
  return dayNumber(Math.floor(monthNumber / 12), (((monthNumber % 12) + 12) % 12) + 1, 1);
}

/** `2007-01-14`. */
export function formatDate(day: number): string {
  const date = dateOf(day);
  return `${String(date.year).padStart(4, '0')}-${two(date.month)}-${two(date.day)}`;
}

/** `2007-01-14T09:30`, with seconds only where there are any. */
export function formatSeconds(timeSeconds: number): string {
  const day = Math.floor(timeSeconds / secondsOfDay);
  const seconds = Math.floor(timeSeconds - day * secondsOfDay);
  const clock = `${two(Math.floor(seconds / 3600))}:${two(Math.floor(seconds / 60) % 60)}`;
  return `${formatDate(day)}T${clock}${seconds % 60 === 0 ? '' : `:${two(seconds % 60)}`}`;
}

function two(number: number): string {
  return String(number).padStart(2, '0');
}
