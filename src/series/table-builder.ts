import { copied, risingOrder } from './rising.ts';
import type { Step } from './step.ts';
import { Listing, stepFaults } from './step-faults.ts';
import type { SeriesProblem, SeriesTable, TimeAt } from './table.ts';

/**
 * Arrays that a builder has done with, for the next one: the first touch of fresh memory costs more than reading a file into it
 * (measured). Several files may be on their way at once, each with arrays of its own.
 */
const spare: Float64Array[] = [];
const spareAtMost = 16;
const firstLength = 1 << 16;

/** Rows as they are read, in arrays that grow by doubling; sorted and cut to size at the end. */
export class TableBuilder {
  readonly problems = new Listing<SeriesProblem>();
  private rows = 0;
  private capacity = firstLength;
  private timeSeconds = take();
  private lines = take();
  private values: Float64Array[];
  private latest = Number.NEGATIVE_INFINITY;
  private readonly outOfOrder = new Listing<TimeAt>();

  constructor(columns: number) {
    this.values = Array.from({ length: columns }, take);
  }

  get isEmpty(): boolean {
    return this.rows === 0 && this.problems.total === 0;
  }

  /** `values` holds one number for each column, NaN where missing; it is copied. */
  add(line: number, timeSeconds: number, values: Float64Array): void {
    if (this.rows === this.capacity) this.grow();
    const row = this.rows++;
    this.timeSeconds[row] = timeSeconds;
    this.lines[row] = line;
    for (let column = 0; column < values.length; column++)
      (this.values[column] as Float64Array)[row] = values[column] as number;
    if (timeSeconds >= this.latest) this.latest = timeSeconds;
    else this.outOfOrder.add({ line, timeSeconds });
  }

  /** The table; to be called once, at the end. */
  table(about: {
    readonly file: string;
    readonly unit: string;
    readonly step: Step | null;
    readonly names: readonly string[];
  }): SeriesTable {
    const { names, ...rest } = about;
    const { rows } = this;
    const order = risingOrder(this.timeSeconds.subarray(0, rows));
    const timeSeconds = copied(this.timeSeconds, new Float64Array(rows), order);
    const lines = copied(this.lines, new Uint32Array(rows), order);
    const columns = names.map((name, column) => {
      const values = copied(this.values[column] as Float64Array, new Float64Array(rows), order);
      let missing = 0;
      for (let row = 0; row < rows; row++) if (Number.isNaN(values[row])) missing++;
      return { name, values, missing };
    });
    for (const array of [this.timeSeconds, this.lines, ...this.values])
      if (spare.length < spareAtMost && array.length === firstLength) spare.push(array);
    const { problems, outOfOrder } = this;
    return {
      ...rest,
      timeSeconds,
      lines,
      columns,
      problems,
      outOfOrder,
      ...stepFaults(timeSeconds, lines, about.step),
    };
  }

  private grow(): void {
    this.capacity *= 2;
    const grown = (array: Float64Array) => copied(array, new Float64Array(this.capacity), null);
    this.timeSeconds = grown(this.timeSeconds);
    this.lines = grown(this.lines);
    this.values = this.values.map(grown);
  }
}

function take(): Float64Array {
  return spare.pop() ?? new Float64Array(firstLength);
}
