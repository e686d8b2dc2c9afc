import { copied, risingOrder } from './rising.ts';
import { irregular, type Step } from './step.ts';
import type { SeriesTable } from './table.ts';

/** One quantity over time: a column of a table, or what was made of several. */
export interface Series {
  readonly unit: string;
  readonly step: Step;
  /** Strictly rising, as in `SeriesTable`. Steps that nothing is known of may be absent. */
  readonly timeSeconds: Float64Array;
  /** NaN where missing. */
  readonly values: Float64Array;
}

/**
 * One column of a table, by name, or by place from 1 among those that were read. A time that several rows hold has no value of its
 * own: it stands once, and as missing. Throws a RangeError for a column that was not read.
 */
export function columnOf(table: SeriesTable, column: string | number = 1): Series {
  const found =
    typeof column === 'number'
      ? table.columns[column - 1]
      : table.columns.find(({ name }) => name === column);
  if (found === undefined) throw new RangeError(`${table.file} was read without the column ${column}`);
  const { unit, timeSeconds } = table;
  return withoutRepeats({ unit, step: table.step ?? irregular, timeSeconds, values: found.values });
}

/**
 * Files that follow one another, such as one for each year, as one series in the unit and step of the first. A time that several of
 * them hold stands once, and as missing.
 */
export function joinSeries(parts: readonly [Series, ...Series[]]): Series {
  const [first] = parts;
  if (parts.length === 1) return first;
  const timeSeconds = joined(parts.map((part) => part.timeSeconds));
  const values = joined(parts.map((part) => part.values));
  const order = risingOrder(timeSeconds);
  return withoutRepeats({
    ...first,
    timeSeconds: copied(timeSeconds, new Float64Array(timeSeconds.length), order),
    values: copied(values, new Float64Array(values.length), order),
  });
}

/** Leaves each time once; a time that came more than once has no value. Times must not fall. */
export function withoutRepeats(series: Series): Series {
  const { timeSeconds, values } = series;
  const rows = timeSeconds.length;
  let repeats = false;
  for (let row = 1; row < rows && !repeats; row++) repeats = timeSeconds[row] === timeSeconds[row - 1];
  if (!repeats) return series;
  const times: number[] = [];
  const kept: number[] = [];
  for (let row = 0; row < rows; row++) {
    const time = timeSeconds[row] as number;
    if (time === times.at(-1)) kept[kept.length - 1] = Number.NaN;
    else {
      times.push(time);
      kept.push(values[row] as number);
    }
  }
  return { ...series, timeSeconds: Float64Array.from(times), values: Float64Array.from(kept) };
}

function joined(arrays: readonly Float64Array[]): Float64Array {
  const whole = new Float64Array(arrays.reduce((length, array) => length + array.length, 0));
  let at = 0;
  for (const array of arrays) {
    whole.set(array, at);
    at += array.length;
  }
  return whole;
}
