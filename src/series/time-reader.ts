import { parseDate, secondsOfDay } from './calendar.ts';
import { parsePattern, patternTime } from './date-pattern.ts';
import type { ColumnReference, TimeLayout } from './layout.ts';
import { wholeNumberAt } from './number-text.ts';
import type { Rows } from './rows.ts';
import { afterSteps, isByDate, type Step, startOfStep } from './step.ts';
import { Days, isoTime, parseOffset, type TimeOfRow, timeFor } from './time-text.ts';

/** How the time of a row is read, once the columns are known. */
export interface TimeReader {
  readonly columns: readonly ColumnReference[];
  /** What stands in the file where all is well, for messages. */
  readonly expected: string;
  readonly advice: string;
  /** `places` are the columns' places in a row, from 0, in the order of `columns`. */
  timeOf(places: readonly number[]): TimeOfRow;
}

/** Prepares the reading of times; a text says why the layout can't be used. */
export function timeReader(
  layout: TimeLayout,
  step: Step | null,
  utcOffset: string | undefined,
): TimeReader | string {
  if (typeof layout === 'string' || typeof layout === 'number') return isoReader(layout, step, utcOffset);
  if ('pattern' in layout) {
    const parts = parsePattern(layout.pattern, step);
    if (typeof parts === 'string') return `the pattern "${layout.pattern}" can't be used: ${parts}`;
    return {
      columns: [layout.column],
      expected: `a time written ${layout.pattern}`,
      advice: '',
      timeOf: (places) => patternTime(place(places, 0), parts, step),
    };
  }
  if ('counter' in layout) return counterReader(layout, step);
  if ('day_of_year' in layout)
    return {
      columns: [layout.year, layout.day_of_year],
      expected: 'a year and a day of that year (1 to 365, in leap years 366)',
      advice: '',
      timeOf: (places) => partsTime(places, step, (days, year, day) => days.ofYear(year, day)),
    };
  const { year, month, day, hour } = layout;
  if (day === undefined && (hour !== undefined || step?.kind === 'seconds'))
    return 'the time has year and month, but no day, which this step needs';
  return {
    columns: [year, month, ...(day === undefined ? [] : [day]), ...(hour === undefined ? [] : [hour])],
    expected: `a date of the calendar${hour === undefined ? '' : ' and an hour (0 to 24)'} in whole numbers`,
    advice: '',
    timeOf: (places) => partsTime(places, step, (days, y, m, d) => days.of(y, m, day === undefined ? 1 : d)),
  };
}

function isoReader(
  column: ColumnReference,
  step: Step | null,
  utcOffset: string | undefined,
): TimeReader | string {
  const offset = utcOffset === undefined ? null : parseOffset(utcOffset);
  if (utcOffset !== undefined && offset === null)
    return `utc_offset "${utcOffset}" is no offset from UTC such as "+10:00"`;
  return {
    columns: [column],
    expected: isoExpected(step),
    advice: 'if times are written otherwise, state it: time: {column, pattern: "DD/MM/YYYY"}',
    timeOf: (places) => isoTime(place(places, 0), step, offset),
  };
}

function isoExpected(step: Step | null): string {
  if (step?.kind === 'months')
    return step.length % 12 === 0 ? 'a year such as 2010' : 'a month such as 2010-09';
  if (step !== null && isByDate(step)) return 'a date of the calendar such as 2010-09-30';
  return 'a date and time such as 2010-09-30T13:00';
}

/** Times in two to four columns of whole numbers; the fourth is the hour. */
function partsTime(
  places: readonly number[],
  step: Step | null,
  dayOf: (days: Days, first: number, second: number, third: number) => number,
): TimeOfRow {
  const days = new Days();
  const time = timeFor(step);
  const numbers = new Int32Array(4);
  return (rows) => {
    for (let part = 0; part < places.length; part++) {
      const number = wholeNumberAt(rows.bytes, ...fieldOf(rows, place(places, part)));
      if (number < 0) return Number.NaN;
      numbers[part] = number;
    }
    const [first = 0, second = 0, third = 0, hour = 0] = numbers;
    return hour > 24 ? Number.NaN : time(dayOf(days, first, second, third), hour * 3600);
  };
}

function counterReader(
  layout: Extract<TimeLayout, { counter: ColumnReference }>,
  step: Step | null,
): TimeReader | string {
  if (step === null || step.kind === 'irregular')
    return 'the time is a counter of steps, so a step such as P1D must be stated';
  const starts = startsAt(layout.starts);
  if (starts === null) return `the counter starts at "${layout.starts}", which is no date such as 2001-01-01`;
  const begin = startOfStep(starts, step);
  const first = layout.first ?? 1;
  return {
    columns: [layout.counter],
    expected: 'a whole number that counts steps',
    advice: '',
    timeOf: (places) => (rows) => {
      const count = wholeNumberAt(rows.bytes, ...fieldOf(rows, place(places, 0)));
      return count < 0 ? Number.NaN : afterSteps(begin, count - first, step);
    },
  };
}

/** Seconds of `2001-01-01` or `2001-01-01T06:00`; null for other text. */
function startsAt(text: string): number | null {
  const parts = /^(.{10})(?:[T ](\d{2}):(\d{2})(?::(\d{2}))?)?$/.exec(text);
  const day = parseDate(parts?.[1] ?? '');
  const [hour = 0, minute = 0, second = 0] = parts?.slice(2).map((part) => Number(part ?? 0)) ?? [];
  return day === null || hour > 23 || minute > 59 || second > 59
    ? null
    : day * secondsOfDay + hour * 3600 + minute * 60 + second;
}

function fieldOf(rows: Rows, field: number): [number, number] {
  return [rows.starts[field] as number, rows.ends[field] as number];
}

function place(places: readonly number[], index: number): number {
  return places[index] as number;
}
