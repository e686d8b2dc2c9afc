import { formatTime, irregular } from '../../series/step.ts';
import type { Listed, SeriesTable, TimeAt } from '../../series/table.ts';

/** Where something stands in a file of a series: line from 1, and the time as people write it for the step. */
export interface Place {
  readonly line: number;
  readonly time: string;
}

/** A value with its place. */
export interface Valued extends Place {
  readonly value: number;
}

export function placeOf(table: SeriesTable, row: number): Place {
  return { line: table.lines[row] ?? 0, time: timeIn(table, table.timeSeconds[row] ?? 0) };
}

export function timeIn({ step }: SeriesTable, timeSeconds: number): string {
  return formatTime(timeSeconds, step ?? irregular);
}

export function placesIn(table: SeriesTable, { total, first }: Listed<TimeAt>): Listed<Place> {
  return {
    total,
    first: first.map(({ line, timeSeconds }) => ({ line, time: timeIn(table, timeSeconds) })),
  };
}
