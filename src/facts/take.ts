import { RE2JS } from 're2js';
import type { Take, TakeCell } from '../manifest/data.generated.ts';
import { Rows } from '../series/rows.ts';
import { takePointer } from './take-pointer.ts';

/** A value as a file writes it, and the line where it stands (from 1; null where the file's format tells no lines). */
export interface Taken {
  readonly value: string | number | boolean;
  readonly line: number | null;
}

/**
 * Takes the one value that a reading asks for out of a file's content. Answers a text where it can't: what is not there,
 * or stands there more than once, as the end of a sentence.
 */
export function take(content: Uint8Array, how: Take, file: string): Taken | string {
  if ('row' in how) return takeCell(content, how, file);
  const text = new TextDecoder().decode(content);
  if ('pointer' in how) return takePointer(text, how.pointer, file);
  if ('pattern' in how) return takePattern(text, how.pattern, file);
  const lines = text.split(/\r\n|\n|\r/);
  return 'key' in how ? takeKey(lines, how.key, file) : takeWord(lines, how.line, how.word, file);
}

/** `key value`, `key = value` or `key: value`; what follows a blank and `#`, `!`, `;` or `//` is a comment. */
function takeKey(lines: readonly string[], key: string, file: string): Taken | string {
  const found = lines.flatMap((text, index) => {
    const line = text.trimStart();
    const rest = line.startsWith(key) ? /^(?:\s*[=:]|\s)(.*)$/.exec(line.slice(key.length))?.[1] : undefined;
    return rest === undefined ? [] : { value: withoutComment(rest), line: index + 1 };
  });
  return onlyOne(found, `begin with the key \`${key}\``, file);
}

function withoutComment(rest: string): string {
  const quoted = /^\s*(["'])(.*?)\1/.exec(rest);
  return quoted?.[2] ?? ` ${rest}`.replace(/\s(?:[#!;]|\/\/).*$/, '').trim();
}

function takeWord(
  lines: readonly string[],
  line: number,
  word: number | undefined,
  file: string,
): Taken | string {
  const text = lines[line - 1];
  if (text === undefined) return `${file} has no line ${line}; it ends with line ${lines.length}`;
  const value = word === undefined ? text.trim() : text.trim().split(/[\s,;]+/)[word - 1];
  return value ? { value, line } : `line ${line} of ${file} has no word ${word ?? 1}`;
}

/** The pattern runs in time that grows with the file's length only; `^` and `$` stand for begin and end of a line. */
function takePattern(text: string, pattern: string, file: string): Taken | string {
  let compiled: RE2JS;
  try {
    compiled = RE2JS.compile(pattern, RE2JS.MULTILINE);
  } catch (error) {
    return `\`${pattern}\` can’t be read as a regular expression (${error instanceof Error ? error.message : error})`;
  }
  const matcher = compiled.matcher(text);
  const found: Taken[] = [];
  while (found.length <= shownAtMost && matcher.find()) {
    const value = matcher.group(matcher.groupCount() > 0 ? 1 : 0) ?? '';
    found.push({ value, line: text.slice(0, matcher.start()).split(/\r\n|\n|\r/).length });
  }
  return onlyOne(found, `match \`${pattern}\``, file);
}

/** The cell below a column's name (or at its place) in the row whose first cell is `row` (or at its place below the names). */
function takeCell(content: Uint8Array, { row, column, separator }: TakeCell, file: string): Taken | string {
  const rows = rowsOf(content, separator ?? separatorOf(content));
  const header = typeof column === 'number' ? -1 : rows.findIndex(({ cells }) => cells.includes(column));
  if (typeof column !== 'number' && header < 0) return `${file} has no column \`${column}\``;
  const place = typeof column === 'number' ? column - 1 : (rows[header]?.cells.indexOf(column) ?? -1);
  const below = rows.slice(header + 1);
  const found = below.filter(({ cells }, index) =>
    typeof row === 'number' ? index === row - 1 : cells[0] === row,
  );
  const cells = found.map(({ cells, line }) => ({ value: cells[place] ?? '', line }));
  return onlyOne(cells, typeof row === 'number' ? `are row ${row}` : `begin with the cell \`${row}\``, file);
}

function rowsOf(content: Uint8Array, separator: Separator): readonly { cells: string[]; line: number }[] {
  const rows = new Rows(separator, undefined);
  rows.take(content);
  rows.end();
  const all = [];
  while (rows.next()) {
    all.push({ cells: Array.from({ length: rows.count }, (_, field) => rows.text(field)), line: rows.line });
  }
  return all;
}

type Separator = NonNullable<TakeCell['separator']>;

/** What separates the cells of the first line; blanks where it holds none of the others. */
function separatorOf(content: Uint8Array): Separator {
  const [first = ''] = new TextDecoder()
    .decode(content.subarray(0, 65_536))
    .trimStart()
    .split(/[\r\n]/, 1);
  if (first.includes('\t')) return 'tab';
  if (first.includes(';')) return 'semicolon';
  return first.includes(',') ? 'comma' : 'blank';
}

const shownAtMost = 3;

function onlyOne(found: readonly Taken[], what: string, file: string): Taken | string {
  const [first, second] = found;
  if (first === undefined) return `${file} has no lines that ${what}`;
  if (second !== undefined) {
    const lines = found.slice(0, shownAtMost).map(({ line }) => line);
    const more = found.length > shownAtMost ? ' and more' : '';
    return `${file} has several lines that ${what}: ${lines.join(', ')}${more}`;
  }
  return first.value === '' ? `nothing stands there on line ${first.line} of ${file}` : first;
}
