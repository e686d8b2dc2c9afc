import type { Reading } from '../manifest/data.generated.ts';
import {
  dateOf,
  formatDate,
  monthNumber,
  parseDate,
  parseWindow,
  type Window,
  windowDays,
} from '../series/calendar.ts';
import { numberOf, point } from '../series/number-text.ts';
import { conversion } from '../series/units/conversion.ts';

/** How a file writes a value otherwise than the record does. */
export interface Otherwise {
  readonly as: Reading['as'] | undefined;
  /** The unit in the file, and the record's. */
  readonly from: string | undefined;
  readonly to: string | undefined;
}

export interface Compared {
  readonly stated: string | number | null;
  readonly found: string | number;
  readonly agrees: boolean;
}

/** Figures that are equal but for the last bits of a conversion. */
const sameBy = 1e-9;

/**
 * Holds what a file says against what a record states. Numbers are compared as numbers, all else as text; days in a
 * file may be parted by `-`, `/`, `.` or nothing. Answers a text, the end of a sentence that begins with the place in the
 * file, where the two can't be compared.
 */
export function compare(
  taken: string | number | boolean,
  value: unknown,
  { as, from, to }: Otherwise,
): Compared | string {
  const stated = as === undefined ? plain(value) : inPeriod(value, as);
  if (stated === undefined) return 'is held against a field that holds no single value';
  if (typeof stated !== 'number') {
    const found =
      typeof stated === 'string' && parseDate(stated) !== null ? isoDay(String(taken)) : String(taken);
    return { stated, found, agrees: stated === found };
  }
  const number = typeof taken === 'number' ? taken : numberOf(String(taken), point);
  if (Number.isNaN(number)) return `says \`${taken}\`, where a number is expected`;
  if (from === undefined || to === undefined) return { stated, found: number, agrees: same(stated, number) };
  const converted = conversion({ from, to });
  if ('undefined' in converted) return `can’t be compared: ${converted.undefined}`;
  const found = number * converted.value.factor + converted.value.offset;
  return { stated, found, agrees: same(stated, found) };
}

function same(one: number, other: number): boolean {
  return Math.abs(one - other) <= sameBy * Math.max(Math.abs(one), Math.abs(other));
}

/** A single value as it is compared; null for none, undefined for what is several. */
function plain(value: unknown): string | number | null | undefined {
  if (value === undefined || value === null) return null;
  if (typeof value === 'boolean') return String(value);
  if (Array.isArray(value) && value.length === 1) return plain(value[0]);
  return typeof value === 'string' || typeof value === 'number' ? value : undefined;
}

/** What `as` asks of a period, or of several that follow one another; undefined for what is no period. */
function inPeriod(value: unknown, as: NonNullable<Reading['as']>): string | number | null | undefined {
  if (value === undefined) return null;
  const isLength = as === 'days' || as === 'months' || as === 'years';
  if (typeof value === 'object' && value !== null && 'zero_because' in value) return isLength ? 0 : undefined;
  const windows = [value].flat().map((one) => (typeof one === 'string' ? parseWindow(one) : null));
  const whole = windows.filter((window) => window !== null);
  const [first] = whole;
  const last = whole.at(-1);
  if (first === undefined || last === undefined || whole.length < windows.length) return undefined;
  if (as === 'first_day') return formatDate(first.firstDay);
  if (as === 'last_day') return formatDate(last.lastDay);
  if (as === 'first_year') return dateOf(first.firstDay).year;
  if (as === 'last_year') return dateOf(last.lastDay).year;
  const days = whole.reduce((sum, window) => sum + windowDays(window), 0);
  if (as === 'days') return days;
  const months = whole.reduce((sum, window) => sum + monthsIn(window), 0);
  return as === 'months' ? months : months / 12;
}

/** Months in a window: whole ones where it ends on the day before the day of the month on which it began, else days over the mean length. */
function monthsIn(window: Window): number {
  const after = window.lastDay + 1;
  const isWhole = dateOf(after).day === dateOf(window.firstDay).day;
  return isWhole ? monthNumber(after) - monthNumber(window.firstDay) : windowDays(window) / (365.2425 / 12);
}

function isoDay(text: string): string {
  const parts = /^(\d{4})([-/.]?)(\d{2})\2(\d{2})$/.exec(text);
  return parts === null ? text : `${parts[1]}-${parts[3]}-${parts[4]}`;
}
