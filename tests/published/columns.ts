import { readFileSync } from 'node:fs';
import type { Paired, Statistic, Value } from '../../src/hydrology/paired.ts';
import { isDefined, pairInOrder } from '../../src/hydrology/paired.ts';

/** Columns of a small published file; dates as days since 1970-01-01, blanks as null. */
export interface Columns {
  readonly times: readonly number[];
  column(name: string): readonly Value[];
  /** Rows of the window, both ends included. */
  window(ends: readonly [string, string]): Columns;
}

export function columns(file: string): Columns {
  const path = file === 'seattle-weather.csv' ? 'node_modules/vega-datasets/data/' : 'tests/published/data/';
  const [head = '', ...lines] = readFileSync(`${path}${file}`, 'utf8').trim().split(/\r?\n/);
  const names = head.split(',');
  return select(
    names,
    lines.map((line) => line.split(',')),
  );
}

function select(names: readonly string[], rows: readonly (readonly string[])[]): Columns {
  const times = rows.map(([first = '']) => (first.includes('-') ? day(first) : Number(first)));
  return {
    times,
    column(name) {
      const place = names.indexOf(name);
      return rows.map((row) => (row[place] === '' ? null : Number(row[place])));
    },
    window: ([first, last]) =>
      select(
        names,
        rows.filter((_, index) => within(times[index] ?? 0, first, last)),
      ),
  };
}

export function day(date: string): number {
  return Date.parse(date) / 86_400_000;
}

function within(time: number, first: string, last: string): boolean {
  return time >= day(first) && time <= day(last);
}

/** No gap expected: throws on a missing value. */
export function numbers(values: readonly Value[]): number[] {
  return values.map((value) => {
    if (value === null) throw new Error('a value is missing');
    return value;
  });
}

/** Pairs with the dates of the file in place of counted days. */
export function pairs(of: {
  readonly times: readonly number[];
  readonly observed: readonly Value[];
  readonly simulated: readonly Value[];
}): Paired {
  const paired = pairInOrder(of);
  return { ...paired, times: paired.times.map((step) => of.times[step] ?? Number.NaN) };
}

/** The value, or null where the reason is in words. */
export function plain<T>(statistic: Statistic<T>): T | null {
  if (isDefined(statistic)) return statistic.value;
  if (statistic.undefined.length < 10) throw new Error('an undefined statistic needs a reason in words');
  return null;
}

/** Totals or means of the present days of each group, the groups in order. */
export function grouped(of: {
  readonly times: readonly number[];
  readonly values: readonly Value[];
  readonly by: (date: Date) => number;
}): { readonly group: number; readonly values: Value[]; readonly times: number[] }[] {
  const groups = new Map<number, { group: number; values: Value[]; times: number[] }>();
  of.times.forEach((time, index) => {
    const group = of.by(new Date(time * 86_400_000));
    const entry = groups.get(group) ?? { group, values: [], times: [] };
    entry.values.push(of.values[index] ?? null);
    entry.times.push(time);
    groups.set(group, entry);
  });
  return [...groups.values()].sort((a, b) => a.group - b.group);
}

export const byMonth = (date: Date) => date.getUTCFullYear() * 12 + date.getUTCMonth();
export const byYear = (date: Date) => date.getUTCFullYear();
export const byWaterYear = (date: Date) => date.getUTCFullYear() + (date.getUTCMonth() >= 9 ? 1 : 0);
