import { secondsOfDay } from './calendar.ts';
import type { Step } from './step.ts';
import { Days, type TimeOfRow, timeFor } from './time-text.ts';

const shortMonths = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];

type Field = 'year' | 'month' | 'day' | 'dayOfYear' | 'hour' | 'minute' | 'second';

type Part =
  | { readonly kind: 'digits'; readonly field: Field; readonly least: number; readonly most: number }
  | { readonly kind: 'name' }
  | { readonly kind: 'text'; readonly byte: number };

const digits = (field: Field, least: number, most: number): Part => ({ kind: 'digits', field, least, most });

const tokens: Readonly<Record<string, Part>> = {
  YYYY: digits('year', 4, 4),
  MMM: { kind: 'name' },
  MM: digits('month', 2, 2),
  M: digits('month', 1, 2),
  DDD: digits('dayOfYear', 3, 3),
  DD: digits('day', 2, 2),
  D: digits('day', 1, 2),
  hh: digits('hour', 2, 2),
  h: digits('hour', 1, 2),
  mm: digits('minute', 2, 2),
  ss: digits('second', 2, 2),
};

/** Takes a pattern such as `DD.MM.YYYY hh:mm` apart; a text says why it can't be used. */
export function parsePattern(pattern: string, step: Step | null): readonly Part[] | string {
  const parts: Part[] = [];
  const fields = new Set<Field>();
  for (const [piece] of pattern.matchAll(/Y+|M+|D+|h+|m+|s+|[^YMDhms]/gu)) {
    const part = tokens[piece];
    if (part === undefined && /^[A-Za-z]/.test(piece) && piece !== 'T' && piece !== 'Z')
      return `"${piece}" stands for no part of a time; what does: ${Object.keys(tokens).join(', ')}`;
    if (part === undefined) for (const byte of Buffer.from(piece)) parts.push({ kind: 'text', byte });
    else {
      const field = part.kind === 'digits' ? part.field : 'month';
      if (fields.has(field)) return `the ${field} comes twice`;
      fields.add(field);
      parts.push(part);
    }
  }
  if (!fields.has('year')) return 'it has no year of four digits (YYYY)';
  if (fields.has('dayOfYear') && (fields.has('month') || fields.has('day')))
    return 'the day of the year goes with neither month nor day';
  const finest = fields.has('dayOfYear') || (fields.has('month') && fields.has('day'));
  if (step?.kind === 'seconds' && !finest) return 'it gives no day, which this step needs';
  return parts;
}

/** Reads times written by a pattern that `parsePattern` took apart. */
export function patternTime(column: number, parts: readonly Part[], step: Step | null): TimeOfRow {
  const days = new Days();
  const time = timeFor(step);
  const byDayOfYear = parts.some((part) => part.kind === 'digits' && part.field === 'dayOfYear');
  return (rows) => {
    const { bytes } = rows;
    const end = rows.ends[column] as number;
    let at = rows.starts[column] as number;
    const read = { year: 0, month: 1, day: 1, dayOfYear: 0, hour: 0, minute: 0, second: 0 };
    for (const part of parts) {
      if (part.kind === 'text') {
        if (at === end || bytes[at] !== part.byte) return Number.NaN;
        at++;
      } else if (part.kind === 'name') {
        const name = Buffer.from(bytes.subarray(at, Math.min(at + 3, end))).toString('latin1');
        read.month = shortMonths.indexOf(name.toLowerCase()) + 1;
        at += 3;
      } else {
        let number = 0;
        let count = 0;
        for (; count < part.most && at < end; count++, at++) {
          const digit = (bytes[at] as number) - 48;
          if (digit < 0 || digit > 9) break;
          number = number * 10 + digit;
        }
        if (count < part.least) return Number.NaN;
        read[part.field] = number;
      }
    }
    if (at !== end || read.minute > 59 || read.second > 59) return Number.NaN;
    const seconds = read.hour * 3600 + read.minute * 60 + read.second;
    if (seconds > secondsOfDay) return Number.NaN;
    const day = byDayOfYear
      ? days.ofYear(read.year, read.dayOfYear)
      : days.of(read.year, read.month, read.day);
    return time(day, seconds);
  };
}
