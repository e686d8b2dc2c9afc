import type { LineCounter } from 'yaml';
import { type FieldPath, fieldName, type Problem } from './manifest.ts';

/** A problem before its place in the text is turned into line and column. */
export interface Fault {
  readonly offset: number;
  readonly field: FieldPath;
  readonly message: string;
  readonly expected: string;
  readonly found: string;
  readonly nearest?: string | undefined;
}

export function toProblem(fault: Fault, lines: LineCounter): Problem {
  const { line, col: column } = lines.linePos(fault.offset);
  const { message, expected, found, nearest } = fault;
  const problem = { line, column, field: fieldName(fault.field), message, expected, found };
  return nearest === undefined ? problem : { ...problem, nearest };
}

/** A value as messages show it: short, on one line. */
export function shown(value: unknown): string {
  if (value === null || value === undefined) return 'nothing';
  if (Array.isArray(value)) return value.length === 0 ? 'an empty list' : 'a list';
  if (typeof value === 'object') return Object.keys(value).length === 0 ? 'an empty map' : 'a map';
  if (typeof value === 'string') return quoted(value);
  return typeof value === 'number' ? `the number ${value}` : String(value);
}

export function quoted(text: string): string {
  return `"${shortened(text)}"`;
}

/** A text on one line, cut where it is long. */
export function shortened(text: string): string {
  const line = text.replace(/\s+/g, ' ');
  return line.length > 60 ? `${line.slice(0, 57)}...` : line;
}
