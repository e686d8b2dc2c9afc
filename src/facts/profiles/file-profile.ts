import type { Listed, SeriesProblem, SeriesTable } from '../../series/table.ts';
import { type ColumnProfile, columnProfile } from './column-profile.ts';
import { type Place, placesIn, timeIn } from './places.ts';

/** Steps that no row of a file holds, and the line of the row that follows them. */
export interface AbsentSteps extends Place {
  /** First of them; `time` is the last. */
  readonly from: string;
  readonly steps: number;
}

/** What one file of a series holds, by itself. JSON can say all of it. */
export interface FileProfile {
  /** Rows that could be read. */
  readonly rows: number;
  /** Labels of the first and the last row in seconds since 1970-01-01T00:00 on the station's clock; null without rows. */
  readonly firstSeconds: number | null;
  readonly lastSeconds: number | null;
  /** The longest time between rows in seconds; 0 with fewer than two. */
  readonly longestSeconds: number;
  /** The time between rows in seconds that more than half of them have; 0 where there is none. */
  readonly usualSeconds: number;
  readonly columns: readonly ColumnProfile[];
  /** Rows that can't be read as the layout says, or why the file can't. */
  readonly problems: Listed<SeriesProblem>;
  readonly outOfOrder: Listed<Place>;
  readonly repeated: Listed<Place>;
  readonly offStep: Listed<Place>;
  readonly absent: Listed<AbsentSteps>;
}

/** Raised whenever the same file may get another profile. */
export const fileProfileVersion = 1;

/** `isRain` asks for the largest amounts too, which only rain has bounds for. */
export function fileProfile(table: SeriesTable, isRain: boolean): FileProfile {
  const { timeSeconds, absent } = table;
  return {
    rows: timeSeconds.length,
    firstSeconds: timeSeconds[0] ?? null,
    lastSeconds: timeSeconds.at(-1) ?? null,
    ...distances(timeSeconds),
    columns: table.columns.map((column) => columnProfile(table, column, isRain)),
    problems: { total: table.problems.total, first: table.problems.first },
    outOfOrder: placesIn(table, table.outOfOrder),
    repeated: placesIn(table, table.repeated),
    offStep: placesIn(table, table.offStep),
    absent: {
      total: absent.total,
      first: absent.first.map(({ firstSeconds, lastSeconds, steps }) => ({
        from: timeIn(table, firstSeconds),
        time: timeIn(table, lastSeconds),
        line: table.lines[timeSeconds.findIndex((time) => time > lastSeconds)] ?? 0,
        steps,
      })),
    },
  };
}

function distances(timeSeconds: Float64Array): Pick<FileProfile, 'longestSeconds' | 'usualSeconds'> {
  const counts = new Map<number, number>();
  let longestSeconds = 0;
  for (let row = 1; row < timeSeconds.length; row++) {
    const distance = (timeSeconds[row] as number) - (timeSeconds[row - 1] as number);
    longestSeconds = Math.max(longestSeconds, distance);
    if (distance > 0) counts.set(distance, (counts.get(distance) ?? 0) + 1);
  }
  const [usual] = [...counts].filter(([, count]) => count > (timeSeconds.length - 1) / 2);
  return { longestSeconds, usualSeconds: usual?.[0] ?? 0 };
}
