import { formatTime, irregular } from './step.ts';
import type { SeriesTable } from './table.ts';

/** How a series changed between two versions of its file. Figures run over values that are present and finite. */
export interface SeriesDifference {
  /** Values in the new file. */
  readonly values: number;
  /** Values that differ, were added or were removed. */
  readonly changed: number;
  readonly totalBefore: number;
  readonly totalAfter: number;
  /** First and last time step touched, as written for people (`2007-01-14`); null when no value changed (only text did). */
  readonly first: string | null;
  readonly last: string | null;
  readonly unit: string;
  /** Rows of the new file that can't be read; they take no part. */
  readonly unread: number;
}

/**
 * Compares two versions of a file value by value, joined by time and by name of column. A value that became missing,
 * or was missing, has changed; two missing ones are alike. Totals and counts run over all columns together.
 */
export function differenceOfSeries(before: SeriesTable, after: SeriesTable): SeriesDifference {
  let changed = 0;
  let first = Number.POSITIVE_INFINITY;
  let last = Number.NEGATIVE_INFINITY;
  const names = new Set([...before.columns, ...after.columns].map((column) => column.name));
  for (const name of names) {
    const old = valuesOf(before, name);
    const now = valuesOf(after, name);
    let i = 0;
    let j = 0;
    while (i < before.timeSeconds.length || j < after.timeSeconds.length) {
      const oldTime = before.timeSeconds[i] ?? Number.POSITIVE_INFINITY;
      const newTime = after.timeSeconds[j] ?? Number.POSITIVE_INFINITY;
      const time = Math.min(oldTime, newTime);
      const oldValue = oldTime === time ? old[i++] : undefined;
      const newValue = newTime === time ? now[j++] : undefined;
      if (Object.is(present(oldValue), present(newValue))) continue;
      changed++;
      first = Math.min(first, time);
      last = Math.max(last, time);
    }
  }
  const step = after.step ?? irregular;
  return {
    values: sumOver(after, () => 1),
    changed,
    totalBefore: sumOver(before, (value) => value),
    totalAfter: sumOver(after, (value) => value),
    first: changed === 0 ? null : formatTime(first, step),
    last: changed === 0 ? null : formatTime(last, step),
    unit: after.unit,
    unread: after.problems.total,
  };
}

function valuesOf(table: SeriesTable, name: string): ArrayLike<number> {
  return table.columns.find((column) => column.name === name)?.values ?? [];
}

/** Missing and absent are one; so are the two zeros. */
function present(value: number | undefined): number | undefined {
  return value === undefined || Number.isNaN(value) ? undefined : value + 0;
}

function sumOver(table: SeriesTable, of: (value: number) => number): number {
  let sum = 0;
  for (const { values } of table.columns)
    for (const value of values) if (!Number.isNaN(value)) sum += of(value);
  return sum;
}
