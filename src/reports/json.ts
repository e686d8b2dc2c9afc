import type { Verdict } from '../verdict/finding.ts';
import { obeyedAnywhere } from './escape.ts';

/** The verdict as `stoplog-findings/1` JSON (schemas/findings.schema.json). */
export function jsonReport(verdict: Verdict): string {
  return jsonText(verdict);
}

/**
 * JSON with two-space indent and a final newline. Signs that end a line to some readers, and what CI hosts obey in the midst of
 * one, are written as escapes; what is read is the same.
 */
export function jsonText(value: unknown): string {
  const text = JSON.stringify(value, null, 2)
    .replace(obeyedAnywhere, '\\u0023')
    .replace(/[\u0085\u2028\u2029]/g, (sign) => `\\u${sign.charCodeAt(0).toString(16).padStart(4, '0')}`);
  return `${text}\n`;
}
