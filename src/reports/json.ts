import type { Verdict } from '../verdict/finding.ts';

/** The verdict as `stoplog-findings/1` JSON (schemas/findings.schema.json), two-space indent, final newline. */
export function jsonReport(verdict: Verdict): string {
  return `${JSON.stringify(verdict, null, 2)}\n`;
}
