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
 * ends and doubled quotation marks inside; blanks around fields do not count; lines end with LF, CRLF or CR.
 * Blank lines, and those that begin with the comment character, are passed over but counted.
 */
export class Rows {
  /** The bytes that `starts` and `ends` point into. */
  bytes: Uint8Array = new Uint8Array(0);
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
  /** Whether a byte-order mark has been looked for. */
  private begun = false;
  private readonly kinds = new Uint8Array(256);
  private readonly byBlanks: boolean;
  /** The blank that is no separator and is trimmed; in tab-separated files a tab separates. */
  private readonly trimsTab: boolean;
  private readonly comment: number;

  constructor(separator: 'comma' | 'semicolon' | 'tab' | 'blank', comment: string | undefined) {
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
    this.bytes = this.bytes.length === 0 ? chunk : Buffer.concat([this.bytes, chunk]);
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
      const byte = this.bytes[begins] as number;
      if (byte === this.comment || byte === lineFeed || byte === carriageReturn) {
        if (!this.skipLine()) return false;
      } else return this.split();
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
    this.bytes = this.bytes.slice(this.position);
    this.position = 0;
  }

  private split(): boolean {
    const { bytes, kinds, byBlanks } = this;
    const end = bytes.length;
    const line = this.nextLine;
    let linesInside = 0;
    let count = 0;
    let torn = false;
    let { starts, ends } = this;
    let at = this.position;
    for (;;) {
      if ((bytes[at] as number) <= space) at = this.skipBlanks(at);
      let begins = at;
      let stops: number;
      if (at < end && bytes[at] === quote) {
        begins = ++at;
        for (;;) {
          while (at < end && bytes[at] !== quote) {
            if (bytes[at] === lineFeed || (bytes[at] === carriageReturn && bytes[at + 1] !== lineFeed))
              linesInside++;
            at++;
          }
          if (at + 1 >= end) return false;
          if (bytes[at + 1] !== quote) break;
          at += 2;
        }
        stops = at++;
        const after = at;
        while (at < end && kinds[bytes[at] as number] === ordinary) at++;
        if (this.skipBlanks(after) < at) torn = true;
      } else {
        while (at < end && kinds[bytes[at] as number] === ordinary) at++;
        stops = at;
        while (stops > begins && (bytes[stops - 1] === space || bytes[stops - 1] === tab)) stops--;
      }
      if (at === end) return false;
      if (count === starts.length) ({ starts, ends } = this.widen());
      starts[count] = begins;
      ends[count] = stops;
      count++;
      if (byBlanks) at = this.skipBlanks(at);
      if (at === end) return false;
      if (kinds[bytes[at] as number] === lineEnding) break;
      if (!byBlanks) at++;
    }
    if (!this.endLine(at)) return false;
    this.nextLine += linesInside;
    this.line = line;
    this.count = count;
    this.torn = torn;
    return true;
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
