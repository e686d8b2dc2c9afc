import { dateOf, firstDayOfMonth, formatDate, formatSeconds, monthNumber, secondsOfDay } from './calendar.ts';

/**
 * The time step of a series. Months and years have no fixed length, so they are counted in months;
 * all others in seconds. An irregular series, such as grab samples, has none.
 */
export type Step =
  | { readonly kind: 'seconds'; readonly length: number }
  | { readonly kind: 'months'; readonly length: number }
  | { readonly kind: 'irregular' };

export const daily: Step = { kind: 'seconds', length: secondsOfDay };
export const monthly: Step = { kind: 'months', length: 1 };
export const yearly: Step = { kind: 'months', length: 12 };
export const irregular: Step = { kind: 'irregular' };

/**
 * A step written as an ISO 8601 duration (`P1D`, `PT15M`, `P1M`, `P1Y`, `P1W`), or `irregular`.
 * Null for other text, a length of zero, fractions, and durations that mix months with days.
 */
export function parseStep(text: string): Step | null {
  if (text === 'irregular') return irregular;
  const parts =
    /^P(?:(\d+)Y)?(?:(\d+)M)?(?:(\d+)W)?(?:(\d+)D)?(?:T(?=\d)(?:(\d+)H)?(?:(\d+)M)?(?:(\d+)S)?)?$/.exec(text);
  if (parts === null) return null;
  const [years = 0, months = 0, weeks = 0, days = 0, hours = 0, minutes = 0, seconds = 0] = parts
    .slice(1)
    .map((part) => (part === undefined ? 0 : Number(part)));
  const inMonths = years * 12 + months;
  const inSeconds = (weeks * 7 + days) * secondsOfDay + hours * 3600 + minutes * 60 + seconds;
  if (inMonths > 0 && inSeconds === 0) return { kind: 'months', length: inMonths };
  if (inSeconds > 0 && inMonths === 0) return { kind: 'seconds', length: inSeconds };
  return null;
}

export function sameStep(one: Step, other: Step): boolean {
  if (one.kind === 'irregular' || other.kind === 'irregular') return one.kind === other.kind;
  return one.kind === other.kind && one.length === other.length;
}

/** Whether one value stands for a whole day or longer, so that only the date of its time counts. */
export function isByDate(step: Step): boolean {
  return step.kind === 'months' || (step.kind === 'seconds' && step.length % secondsOfDay === 0);
}

/**
 * Where a time stands in a series of that step: daily and longer steps by their date, months by the month that
 * holds the date. The hour of a daily value and the day of a monthly one only say how the file labels it.
 */
export function startOfStep(timeSeconds: number, step: Step): number {
  if (!isByDate(step)) return timeSeconds;
  const day = Math.floor(timeSeconds / secondsOfDay);
  if (step.kind !== 'months') return day * secondsOfDay;
  if (step.length % 12 === 0) return firstDayOfMonth(dateOf(day).year * 12) * secondsOfDay;
  return firstDayOfMonth(monthNumber(day)) * secondsOfDay;
}

/** Steps from one time to a later one, whole where both stand on the same grid; NaN for irregular series. */
export function stepsBetween(from: number, to: number, step: Step): number {
  if (step.kind === 'seconds') return (to - from) / step.length;
  if (step.kind === 'irregular') return Number.NaN;
  return (
    (monthNumber(Math.floor(to / secondsOfDay)) - monthNumber(Math.floor(from / secondsOfDay))) / step.length
  );
}

/** The time that many steps later; the time itself for irregular series. */
export function afterSteps(from: number, steps: number, step: Step): number {
  if (step.kind === 'seconds') return from + steps * step.length;
  if (step.kind === 'irregular') return from;
  return firstDayOfMonth(monthNumber(Math.floor(from / secondsOfDay)) + steps * step.length) * secondsOfDay;
}

/** A time as people write it for that step: `2007`, `2007-01`, `2007-01-14` or `2007-01-14T09:00`. */
export function formatTime(timeSeconds: number, step: Step): string {
  const day = Math.floor(timeSeconds / secondsOfDay);
  if (step.kind === 'months')
    return step.length % 12 === 0 ? String(dateOf(day).year).padStart(4, '0') : formatDate(day).slice(0, 7);
  if (step.kind === 'irregular' && timeSeconds === day * secondsOfDay) return formatDate(day);
  return isByDate(step) ? formatDate(day) : formatSeconds(timeSeconds);
}

/** A step as ISO 8601 writes it, in the largest units that divide it. */
export function formatStep(step: Step): string {
  if (step.kind === 'irregular') return 'irregular';
  const { kind, length } = step;
  if (kind === 'months') return length % 12 === 0 ? `P${length / 12}Y` : `P${length}M`;
  if (length % secondsOfDay === 0) return `P${length / secondsOfDay}D`;
  if (length % 3600 === 0) return `PT${length / 3600}H`;
  return length % 60 === 0 ? `PT${length / 60}M` : `PT${length}S`;
}
