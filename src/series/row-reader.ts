import { findColumns } from './columns.ts';
import type { SeriesLayout } from './layout.ts';
import { isNoPlausibleValue } from './missing-codes.ts';
import { comma, numberAt, numberOf, point } from './number-text.ts';
import type { Plan } from './plan.ts';
import { longestRow, Rows } from './rows.ts';
import type { SeriesTable } from './table.ts';
import { TableBuilder } from './table-builder.ts';
import type { TimeOfRow } from './time-text.ts';

/** One file on its way from bytes to a table. */
export class RowReader {
  readonly rows: Rows;
  private readonly plan: Plan;
  private readonly unit: string;
  private readonly table: TableBuilder;
  private readonly values: Float64Array;
  private readonly hasHeader: boolean;
  private linesToSkip: number;
  private names: readonly string[] = [];
  private places: readonly number[] = [];
  private timePlaces: readonly number[] = [];
  /** Null until the columns are known. */
  private timeOf: TimeOfRow | null = null;
  /** Fields that a row needs for the columns asked for, and those that it may have; null until known. */
  private narrowest = 0;
  private widest: number | null = null;

  constructor(plan: Plan, layout: SeriesLayout) {
    this.plan = plan;
    this.rows = new Rows(plan.separator, layout.comment, layout.widths);
    this.unit = layout.unit ?? '';
    this.table = new TableBuilder(plan.values.length);
    this.values = new Float64Array(plan.values.length);
    this.hasHeader = layout.header ?? true;
    this.linesToSkip = layout.skip_lines ?? 0;
  }

  /** Reads the rows that are whole by now; false when nothing more can be read from this file. */
  readOn(): boolean {
    const { rows } = this;
    while (this.linesToSkip > 0 && rows.skip()) this.linesToSkip--;
    if (this.linesToSkip > 0) return true;
    while (rows.next()) {
      if (this.timeOf !== null) this.readRow(this.timeOf);
      else if (!this.begin()) return false;
    }
    if (rows.foreign !== null)
      return this.refuseFile('text in UTF-8', rows.foreign, 'save the file as UTF-8');
    return rows.overlong ? this.neverEnds() : true;
  }

  /** To be called once, when the file has ended and `readOn` never said false. */
  close(): void {
    this.rows.end();
    if (!this.readOn()) return;
    if (!this.rows.isEmpty) this.neverEnds();
    else if (this.table.isEmpty) this.refuseFile('rows of values', 'none', '');
  }

  finish(file: string): SeriesTable {
    return this.table.table({ file, unit: this.unit, step: this.plan.step, names: this.names });
  }

  /** Takes the header, or the first row where there is none; false when the columns can't be found. */
  private begin(): boolean {
    const { plan, rows } = this;
    const names = Array.from({ length: rows.count }, (_, field) => rows.text(field));
    const header = this.hasHeader ? { names, line: rows.line } : null;
    const columns = findColumns([...plan.time.columns, ...plan.values], header);
    if ('expected' in columns) {
      this.table.problems.add(columns);
      return false;
    }
    this.timePlaces = columns.places.slice(0, plan.time.columns.length);
    this.places = columns.places.slice(plan.time.columns.length);
    this.names = columns.names.slice(plan.time.columns.length);
    this.narrowest = Math.max(...columns.places) + 1;
    const timeOf = plan.time.timeOf(this.timePlaces);
    this.timeOf = timeOf;
    if (!this.hasHeader) this.readRow(timeOf);
    else if (rows.count >= this.narrowest && !Number.isNaN(timeOf(rows)))
      return this.refuse(
        'a header with the names of the columns',
        shortened(names.join(' ')),
        'if the file has none, say header: false',
      );
    // A header set in blanks may hold names of several words.
    else if (plan.separator !== 'blank') this.widest = rows.count;
    return true;
  }

  private readRow(timeOf: TimeOfRow): void {
    const { plan, rows, places, values } = this;
    this.widest ??= rows.count;
    if (rows.torn || rows.count < this.narrowest || rows.count > this.widest) {
      if (!this.rowHolds(this.widest)) return;
    }
    const timeSeconds = timeOf(rows);
    if (Number.isNaN(timeSeconds)) {
      const found = this.timePlaces.map((place) => rows.text(place)).join(' ');
      const column = plan.time.columns.map((name) => columnName(name)).join(', ');
      this.refuse(plan.time.expected, quoted(found), plan.time.advice, column);
      return;
    }
    for (let column = 0; column < places.length; column++) {
      const place = places[column] as number;
      const number = numberAt(
        rows.bytes,
        rows.starts[place] as number,
        rows.ends[place] as number,
        plan.decimalMark,
      );
      if (Number.isNaN(number)) {
        const text = rows.text(place);
        if (!plan.missing.texts.has(text)) {
          this.refuseValue(column, text);
          return;
        }
        values[column] = number;
      } else if (plan.missing.numbers.includes(number)) values[column] = Number.NaN;
      else if (isNoPlausibleValue(number)) {
        this.refuseValue(column, rows.text(place));
        return;
      } else values[column] = number;
    }
    this.table.add(rows.line, timeSeconds, values);
  }

  /** Whether a row of unusual shape can be read all the same: empty fields may follow the last column. */
  private rowHolds(widest: number): boolean {
    const { rows } = this;
    if (rows.torn) {
      this.refuse('a separator after a quoted field', 'text after its closing quotation mark', '');
      return false;
    }
    let count = rows.count;
    while (count > widest && rows.starts[count - 1] === rows.ends[count - 1]) count--;
    if (count >= this.narrowest && count <= widest) return true;
    const text = rows.text(0);
    if (conflictMarker.test(text))
      return this.refuse('a row', quoted(text), 'git left a merge conflict here');
    this.refuse(
      count > widest ? `${widest} columns` : `at least ${this.narrowest} columns`,
      String(count),
      count > widest && this.plan.separator === 'comma'
        ? 'a comma within a value, such as a decimal comma, parts it: quote the value or use another separator'
        : '',
    );
    return false;
  }

  private refuseValue(column: number, text: string): void {
    const { decimalMark } = this.plan;
    const otherMark = decimalMark === comma ? point : comma;
    const number = numberOf(text, decimalMark);
    const what = Number.isNaN(number) ? 'a number' : 'a plausible number';
    let advice = `if it marks a missing value, say missing: [${Number.isNaN(number) ? `"${shortened(text)}"` : number}]`;
    if (!Number.isNaN(numberOf(text, otherMark)) && Number.isNaN(number))
      advice = `if that is its decimal mark, say decimal: ${otherMark === comma ? 'comma' : 'point'}`;
    else if (grouped.test(text)) advice = 'write numbers without separators of thousands';
    const expected = this.unit === '' ? what : `${what} in ${this.unit}`;
    this.refuse(expected, quoted(text), advice, this.names[column] ?? null);
  }

  private neverEnds(): false {
    const expected = `the end of the row within ${longestRow} bytes`;
    const advice = 'look for a quotation mark that is never closed';
    return this.refuse(expected, 'none', advice, null, this.rows.lineInWork);
  }

  private refuseFile(expected: string, found: string, advice: string): false {
    return this.refuse(expected, found, advice, null, null);
  }

  private refuse(
    expected: string,
    found: string,
    advice: string,
    column: string | null = null,
    line: number | null = this.rows.line,
  ): false {
    this.table.problems.add({ line, column, expected, found, advice });
    return false;
  }
}

/** What git writes about and between the two sides of a conflict. */
const conflictMarker = /^(?:<{7}|\|{7}|={7}|>{7})(?: |$)/;

/** `1,234.5`, `1.234,5`, `1 234`. */
const grouped = /^[+-]?\d{1,3}(?:[.,' ]\d{3})+(?:[.,]\d*)?$/;

function columnName(reference: string | number): string {
  return typeof reference === 'number' ? `column ${reference}` : reference;
}

function quoted(text: string): string {
  return text === '' ? 'nothing' : `"${shortened(text)}"`;
}

function shortened(text: string): string {
  const plain = text.replaceAll(/\s+/g, ' ');
  return plain.length > 40 ? `${plain.slice(0, 39)}…` : plain;
}
