const space = 0x20;
const tab = 0x09;
const lineFeed = 0x0a;
const carriageReturn = 0x0d;
const quote = 0x22;

const ordinary = 0;
const separating = 1;
const lineEnding = 2;

/** No honest row of values is longer; a larger one is a quotation mark that never closes, or no text. */
export const longestRow = 1 << 20;

/**
 * Splits bytes into rows and fields without making strings of them. Fields may be quoted as in RFC 4180, with separators, line
 * ends and doubled quotation marks inside; blanks around fields do not count; lines end with LF, CRLF or CR. With `widths` fields
 * are cut at fixed places instead, and what stands beyond the last is one more.
 * Blank lines, and those that begin with the comment character, are passed over but counted.
 */
export class Rows {
  /** The bytes that `starts` and `ends` point into. */
  bytes: Buffer = Buffer.alloc(0);
  /** First byte of each field of the current row, and the byte after its last, without quotation marks. */
  starts = new Int32Array(64);
  ends = new Int32Array(64);
  count = 0;
  /** Line on which the current row begins, from 1. */
  line = 0;
  /** Whether text follows a closing quotation mark in the current row. */
  torn = false;

  /** What the file is, if it is not text that this can read; it then has no rows. */
  foreign: string | null = null;

  private position = 0;
  private nextLine = 1;
  /** Line ends inside the quoted fields of the current row. */
  private linesInside = 0;
  /** Whether a byte-order mark has been looked for. */
  private begun = false;
  private readonly kinds = new Uint8Array(256);
  private readonly byBlanks: boolean;
  /** The blank that is no separator and is trimmed; in tab-separated files a tab separates. */
  private readonly trimsTab: boolean;
  private readonly comment: number;
  private readonly widths: readonly number[] | undefined;

  constructor(
    separator: 'comma' | 'semicolon' | 'tab' | 'blank',
    comment: string | undefined,
    widths?: readonly number[],
  ) {
    this.widths = widths;
    this.byBlanks = separator === 'blank';
    this.trimsTab = separator !== 'tab';
    this.comment = comment === undefined ? -1 : comment.charCodeAt(0);
    this.kinds[lineFeed] = lineEnding;
    this.kinds[carriageReturn] = lineEnding;
    const separators = { comma: [0x2c], semicolon: [0x3b], tab: [tab], blank: [space, tab] };
    for (const byte of separators[separator]) this.kinds[byte] = separating;
  }

  /** Gives the next bytes of the file; rows that they complete can then be read. Nothing of `chunk` is kept beyond the next call. */
  take(chunk: Uint8Array): void {
    const { buffer, byteOffset, length } = chunk;
    this.bytes =
      this.bytes.length === 0 ? Buffer.from(buffer, byteOffset, length) : Buffer.concat([this.bytes, chunk]);
  }

  /** Says that no more bytes come; a last line without a line end counts. */
  end(): void {
    if (this.bytes.length > 0) this.take(Uint8Array.of(lineFeed));
    this.begin(0);
  }

  /** Moves to the next row that holds anything; false when its end is not here yet. */
  next(): boolean {
    const whole = this.begin(3) && this.nextRow();
    if (!whole) this.keepRest();
    return whole;
  }

  /** Moves past one line, whatever is in it; false when its end is not here yet. */
  skip(): boolean {
    const whole = this.begin(3) && this.skipLine();
    if (!whole) this.keepRest();
    return whole;
  }

  /** The line that `next` is on when it gives no row. */
  get lineInWork(): number {
    return this.nextLine;
  }

  /** Whether every byte given has been read. */
  get isEmpty(): boolean {
    return this.bytes.length === 0;
  }

  /** Whether more bytes wait for the end of their row than any honest row has. */
  get overlong(): boolean {
    return this.bytes.length > longestRow;
  }

  /** The text of a field, for messages and column names. */
  text(field: number): string {
    const bytes = this.bytes.subarray(this.starts[field], this.ends[field]);
    return Buffer.from(bytes.buffer, bytes.byteOffset, bytes.length).toString('utf8').replaceAll('""', '"');
  }

  private nextRow(): boolean {
    for (;;) {
      const begins = this.skipBlanks(this.position);
      if (begins === this.bytes.length) return false;
      const byte = this.bytes[begins];
      if (byte !== this.comment && byte !== lineFeed && byte !== carriageReturn)
        return this.widths === undefined ? this.split() : this.cut(this.widths);
      if (!this.skipLine()) return false;
    }
  }

  private skipLine(): boolean {
    let at = this.position;
    while (at < this.bytes.length && this.kinds[this.bytes[at] as number] !== lineEnding) at++;
    return this.endLine(at);
  }

  /** Passes over a byte-order mark, once `enough` bytes are here to tell. */
  private begin(enough: number): boolean {
    if (this.begun) return this.foreign === null;
    if (this.bytes.length < enough) return false;
    this.begun = true;
    const [first, second, third] = this.bytes;
    if (first === 0xef && second === 0xbb && third === 0xbf) this.position = 3;
    if ((first === 0xff && second === 0xfe) || (first === 0xfe && second === 0xff))
      this.foreign = 'UTF-16 text';
    return this.foreign === null;
  }

  private keepRest(): void {
    this.bytes = Buffer.from(this.bytes.subarray(this.position));
    this.position = 0;
  }

  private split(): boolean {
    const { bytes, kinds, byBlanks } = this;
    const end = bytes.length;
    let { starts, ends } = this;
    let count = 0;
    this.torn = false;
    this.linesInside = 0;
    for (let at = this.position; ; at++) {
      if ((bytes[at] as number) <= space) at = this.skipBlanks(at);
      const begins = at;
      if (bytes[at] === quote) at = this.closing(at);
      while (at < end && kinds[bytes[at] as number] === ordinary) at++;
      if (at >= end) return false;
      if (count === starts.length) ({ starts, ends } = this.widen());
      starts[count] = begins;
      ends[count] = at;
      if (bytes[begins] === quote || (bytes[at - 1] as number) <= space) this.trim(count);
      count++;
      if (byBlanks) at = this.skipBlanks(at);
      if (at === end) return false;
      if (kinds[bytes[at] as number] === lineEnding) {
        this.line = this.nextLine;
        this.count = count;
        if (!this.endLine(at)) return false;
        this.nextLine += this.linesInside;
        return true;
      }
      // After blanks the next field has begun.
      if (byBlanks) at--;
    }
  }

  /** Cuts the line at fixed places, counted in characters; a line that ends early has empty fields. */
  private cut(widths: readonly number[]): boolean {
    const { bytes, kinds, position } = this;
    let end = position;
    while (end < bytes.length && kinds[bytes[end] as number] !== lineEnding) end++;
    this.torn = false;
    this.count = 0;
    let at = position;
    for (const width of widths) {
      const begins = at;
      for (let left = width; left > 0 && at < end; left--) {
        at++;
        // The further bytes of one character in UTF-8.
        while (at < end && ((bytes[at] as number) & 0xc0) === 0x80) at++;
      }
      this.field(begins, at);
    }
    if (this.skipBlanks(at) < end) this.field(at, end);
    this.line = this.nextLine;
    return this.endLine(end);
  }

  /** Adds a field, without the blanks around it. */
  private field(from: number, to: number): void {
    if (this.count === this.starts.length) this.widen();
    const begins = Math.min(this.skipBlanks(from), to);
    let stops = to;
    while (stops > begins && (this.bytes[stops - 1] as number) <= space) stops--;
    this.starts[this.count] = begins;
    this.ends[this.count++] = stops;
  }

  /** The place after the quotation mark that closes the field begun at `from`; the end where it is not here yet. */
  private closing(from: number): number {
    const { bytes } = this;
    for (let at = from + 1; at < bytes.length; at++) {
      if (bytes[at] !== quote) continue;
      if (bytes[at + 1] !== quote) return at + 1;
      at++;
    }
    return bytes.length;
  }

  /** Takes blanks and quotation marks off a field; text after the closing mark tears the row. */
  private trim(field: number): void {
    const { bytes, starts, ends } = this;
    const begins = starts[field] as number;
    let stops = ends[field] as number;
    while (stops > begins && (bytes[stops - 1] === space || bytes[stops - 1] === tab)) stops--;
    if (bytes[begins] === quote) {
      if (this.closing(begins) !== stops) this.torn = true;
      for (let at = begins; at < stops; at++)
        if (bytes[at] === lineFeed || (bytes[at] === carriageReturn && bytes[at + 1] !== lineFeed))
          this.linesInside++;
      starts[field] = begins + 1;
      stops--;
    }
    ends[field] = stops;
  }

  private skipBlanks(from: number): number {
    const { bytes, trimsTab } = this;
    let at = from;
    while (at < bytes.length && (bytes[at] === space || (trimsTab && bytes[at] === tab))) at++;
    return at;
  }

  /** Goes to the line after the line end at `at`; false when that is not here yet or a carriage return may be half of one. */
  private endLine(at: number): boolean {
    const { bytes } = this;
    if (at === bytes.length) return false;
    let next = at + 1;
    if (bytes[at] === carriageReturn) {
      if (next === bytes.length) return false;
      if (bytes[next] === lineFeed) next++;
    }
    this.position = next;
    this.nextLine++;
    return true;
  }

  private widen(): this {
    for (const name of ['starts', 'ends'] as const) {
      const wider = new Int32Array(this[name].length * 2);
      wider.set(this[name]);
      this[name] = wider;
    }
    return this;
  }
}
