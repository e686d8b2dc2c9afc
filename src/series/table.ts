import type { Step } from './step.ts';

/** A list of findings kept short: how many there are, and the first of them. */
export interface Listed<T> {
  readonly total: number;
  /** At most `listedAtMost`, in the order of the file. */
  readonly first: readonly T[];
}

export const listedAtMost = 20;

/** A row, or the file as a whole, that can't be read as the layout says. Such rows are left out of the table. */
export interface SeriesProblem {
  /** From 1; null where the file as a whole is meant. */
  readonly line: number | null;
  /** The column's name, or its place as `column 3`; null where the row as a whole is meant. */
  readonly column: string | null;
  /** What the layout promises, such as `a number in m3/s`. */
  readonly expected: string;
  /** What stands there, shortened; for texts of the file in quotation marks. */
  readonly found: string;
  /** What to do about it, a sentence fragment; empty where it is plain. */
  readonly advice: string;
}

/** A time as the file has it, and the line (from 1) where it stands. */
export interface TimeAt {
  readonly line: number;
  readonly timeSeconds: number;
}

/** Steps in a row without a value: start of the first and the last of them. */
export interface Gap {
  readonly firstSeconds: number;
  readonly lastSeconds: number;
  readonly steps: number;
}

export interface SeriesColumn {
  /** As the header has it; `column 3` without a header. */
  readonly name: string;
  /** NaN where the file holds a declared code for a missing value, and nowhere else. */
  readonly values: Float64Array;
  /** How many values are missing. */
  readonly missing: number;
}

/**
 * One file of a time series, read. All arrays have one length: a place for each row that could be read, in rising order
 * of time; rows of one time in the order of the file.
 */
export interface SeriesTable {
  readonly file: string;
  /** As stated in the layout; empty where it is silent. */
  readonly unit: string;
  /** Null where the layout states none: then no step is off the grid or absent. */
  readonly step: Step | null;
  /**
   * Start of each step as the file labels it, in seconds since 1970-01-01T00:00 on the station's clock. Daily and longer steps
   * stand at 00:00 of their date, monthly and yearly ones on the first day.
   */
  readonly timeSeconds: Float64Array;
  /** Line of each row, from 1. */
  readonly lines: Uint32Array;
  /** Those asked for, in that order; none where the layout can't be used or the file lacks one. */
  readonly columns: readonly SeriesColumn[];
  readonly problems: Listed<SeriesProblem>;
  /** Rows whose time is before that of an earlier row. */
  readonly outOfOrder: Listed<TimeAt>;
  /** Rows whose time another row had already. */
  readonly repeated: Listed<TimeAt>;
  /** Rows that leave the grid of steps which the first row begins. */
  readonly offStep: Listed<TimeAt>;
  /** Steps between the first and the last row that no row holds; `total` counts steps, `first` lists runs of them. */
  readonly absent: Listed<Gap>;
}
