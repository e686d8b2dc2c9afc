const millisecondsPerDay = 86_400_000;

/** First and last day, both included, as ISO 8601 dates, and how many days that makes. */
export interface Period {
  readonly first: string;
  readonly last: string;
  readonly days: number;
}

/** `2003-10-01/2009-09-30` taken apart; null unless both are calendar dates and the first is not after the last. */
export function parsePeriod(text: string): Period | null {
  const [first = '', last = '', ...more] = text.split('/');
  if (more.length > 0 || !isDate(first) || !isDate(last) || first > last) return null;
  return { first, last, days: dayNumber(last) - dayNumber(first) + 1 };
}

/** Whether a text is a date of the (proleptic) Gregorian calendar in the form `2004-02-29` (ISO 8601, years 0000 to 9999). */
export function isDate(text: string): boolean {
  return /^\d{4}-\d{2}-\d{2}$/.test(text) && dateOfDay(dayNumber(text)) === text;
}

/** Days from 1970-01-01 to a date, negative before. A day beyond the month's end counts on into the next month. */
export function dayNumber(date: string): number {
  const [year = 0, month = 0, day = 0] = date.split('-').map(Number);
  return new Date(0).setUTCFullYear(year, month - 1, day) / millisecondsPerDay;
}

/** The date that lies so many days after 1970-01-01. */
export function dateOfDay(day: number): string {
  return new Date(day * millisecondsPerDay).toISOString().slice(0, 10);
}
