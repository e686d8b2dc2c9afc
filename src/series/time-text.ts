import { dayNumber, daysInMonth, isLeapYear, secondsOfDay } from './calendar.ts';
import type { Rows } from './rows.ts';
import { isByDate, type Step, startOfStep } from './step.ts';

/** The time of the current row in seconds since 1970-01-01T00:00; NaN where the row has none that the layout allows. */
export type TimeOfRow = (rows: Rows) => number;

/** Day numbers of dates that mostly come in order: the month's first day is kept. NaN for a date that does not exist. */
export class Days {
  private year = 0;
  private month = 0;
  private first = 0;
  private length = 0;

  of(year: number, month: number, day: number): number {
    if (year !== this.year || month !== this.month) {
      if (year < 1 || year > 9999) return Number.NaN;
      this.year = year;
      this.month = month;
      this.length = daysInMonth(year, month);
      if (this.length > 0) this.first = dayNumber(year, month, 1);
    }
    return day >= 1 && day <= this.length ? this.first + day - 1 : Number.NaN;
  }

  /** Day 366 only in leap years. */
  ofYear(year: number, dayOfYear: number): number {
    const last = isLeapYear(year) ? 366 : 365;
    return dayOfYear >= 1 && dayOfYear <= last ? this.of(year, 1, 1) + dayOfYear - 1 : Number.NaN;
  }
}

/** Puts day and seconds of the day together as the step asks: of daily and longer steps only the date counts. */
export function timeFor(step: Step | null): (day: number, seconds: number) => number {
  if (step === null || !isByDate(step)) return (day, seconds) => day * secondsOfDay + seconds;
  if (step.kind === 'months') return (day) => startOfStep(day * secondsOfDay, step);
  return (day) => day * secondsOfDay;
}

/** Two digits as a number; -1 where there are not two. */
function two(bytes: Uint8Array, at: number): number {
  const tens = (bytes[at] as number) - 48;
  const ones = (bytes[at + 1] as number) - 48;
  return tens >= 0 && tens <= 9 && ones >= 0 && ones <= 9 ? tens * 10 + ones : -1;
}

function four(bytes: Uint8Array, at: number): number {
  const hundreds = two(bytes, at);
  const ones = two(bytes, at + 2);
  return hundreds < 0 || ones < 0 ? -1 : hundreds * 100 + ones;
}

const hyphen = 0x2d;
const colon = 0x3a;

/**
 * Seconds from UTC of an offset `Z`, `+10:00`, `-0330` or `+10`; null for other text.
 */
export function parseOffset(text: string): number | null {
  if (text === 'Z' || text === 'z') return 0;
  const parts = /^([+-])(\d{2})(?::?(\d{2}))?$/.exec(text);
  if (parts === null) return null;
  const [hours, minutes] = [Number(parts[2]), Number(parts[3] ?? 0)];
  if (hours > 23 || minutes > 59) return null;
  return (parts[1] === '-' ? -1 : 1) * (hours * 3600 + minutes * 60);
}

/**
 * Reads ISO 8601 in its extended form. `YYYY-MM` serves for steps of months and `YYYY` for steps of years, and both where no
 * step is stated. Times with an offset are brought to `stationOffset` (seconds from UTC) or, where that is null, to the offset
 * of the first of them.
 */
export function isoTime(column: number, step: Step | null, stationOffset: number | null): TimeOfRow {
  const days = new Days();
  const time = timeFor(step);
  const monthsServe = step === null || step.kind === 'months';
  const yearsServe = step === null || (step.kind === 'months' && step.length % 12 === 0);
  let station = stationOffset;

  /** Seconds of the day of a clock time with or without offset, such as `13:00`, `24:00`, `13:00:30Z`. */
  function clock(bytes: Uint8Array, start: number, end: number): number {
    const hour = two(bytes, start);
    const minute = bytes[start + 2] === colon ? two(bytes, start + 3) : -1;
    if (end - start < 5 || hour < 0 || minute < 0 || hour > 24 || minute > 59) return Number.NaN;
    if (hour === 24 && minute > 0) return Number.NaN;
    if (end - start === 5) return hour * 3600 + minute * 60;
    const text = Buffer.from(bytes.subarray(start + 5, end)).toString('latin1');
    const parts = /^(?::([0-5]\d(?:\.\d+)?))?([Zz]|[+-].*)?$/.exec(text);
    const offset = parts?.[2] === undefined ? null : parseOffset(parts[2]);
    if (parts === null || (parts[2] !== undefined && offset === null)) return Number.NaN;
    const seconds = Number(parts[1] ?? 0);
    if (hour === 24 && seconds > 0) return Number.NaN;
    station ??= offset;
    return hour * 3600 + minute * 60 + seconds + (offset === null ? 0 : (station ?? 0) - offset);
  }

  return (rows) => {
    const { bytes } = rows;
    const start = rows.starts[column] as number;
    const end = rows.ends[column] as number;
    const length = end - start;
    const year = length >= 4 ? four(bytes, start) : -1;
    if (year < 0) return Number.NaN;
    if (length === 4) return yearsServe ? time(days.of(year, 1, 1), 0) : Number.NaN;
    if (length < 7 || bytes[start + 4] !== hyphen) return Number.NaN;
    const month = two(bytes, start + 5);
    if (length === 7) return monthsServe ? time(days.of(year, month, 1), 0) : Number.NaN;
    if (length < 10 || bytes[start + 7] !== hyphen) return Number.NaN;
    const day = days.of(year, month, two(bytes, start + 8));
    if (length === 10) return time(day, 0);
    const between = bytes[start + 10];
    if (between !== 0x54 && between !== 0x20) return Number.NaN;
    const seconds = clock(bytes, start + 11, end);
    return Number.isNaN(seconds) ? seconds : time(day, seconds);
  };
}
