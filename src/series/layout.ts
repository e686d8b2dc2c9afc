/** A column by its name in the header, or by its place counted from 1. */
export type ColumnReference = string | number;

/**
 * Where the time of a row stands and how it is written:
 * - a column holding ISO 8601 (`2010-09-30`, `2010-09-30T13:00`, `2010-09-30 13:00:00+10:00`; `2010-09` for monthly and `2010` for
 *   yearly series);
 * - a column written otherwise, by a pattern of `YYYY`, `MM` or `M`, `MMM` (English short name), `DD` or `D`, `DDD` (day of the
 *   year), `hh` or `h`, `mm`, `ss`; other characters stand for themselves;
 * - columns of year, month, day and hour (0 to 24), or of year and day of the year;
 * - a column that counts steps, `starts` being the time at which it says `first` (1 unless stated).
 */
export type TimeLayout =
  | ColumnReference
  | { readonly column: ColumnReference; readonly pattern: string }
  | {
      readonly year: ColumnReference;
      readonly month: ColumnReference;
      readonly day?: ColumnReference | undefined;
      readonly hour?: ColumnReference | undefined;
    }
  | { readonly year: ColumnReference; readonly day_of_year: ColumnReference }
  | { readonly counter: ColumnReference; readonly first?: number | undefined; readonly starts: string };

/** How a file of a time series is laid out. Keys as in the manifest, so that a fragment of it serves as it stands. */
export interface SeriesLayout {
  readonly time?: TimeLayout | undefined;
  readonly values?: ColumnReference | readonly ColumnReference[] | undefined;
  /** `comma` unless stated; `blank` stands for runs of blanks and tabs. */
  readonly separator?: 'comma' | 'semicolon' | 'tab' | 'blank' | undefined;
  /** Of the columns, in characters from the start of each line, where they are fixed and nothing stands between them. */
  readonly widths?: readonly number[] | undefined;
  /** `point` unless stated. */
  readonly decimal?: 'point' | 'comma' | undefined;
  /** Lines before the header (or before the first row) that are no table. */
  readonly skip_lines?: number | undefined;
  /** Whether a line of column names comes first; true unless stated. */
  readonly header?: boolean | undefined;
  /** A character; lines that begin with it are left out. */
  readonly comment?: string | undefined;
  /** Codes of missing values. Numbers, and texts that read as numbers, match by value: -9.9 matches `-9.90`. */
  readonly missing?: readonly (string | number)[] | undefined;
  readonly unit?: string | undefined;
  /** ISO 8601 duration, or `irregular`. */
  readonly step?: string | undefined;
  /** The hour at which the day of a daily value ends. A statement for people and rules; reading does not shift by it. */
  readonly day_ends?: string | undefined;
  /** The station's clock. Times below a day that carry an offset of their own are brought to it; else to that of the first such row. */
  readonly utc_offset?: string | undefined;
}
