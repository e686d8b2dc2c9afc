/** JSON for a file: two-space indent, final newline. Keys keep the order in which they were set. */
export function jsonText(value: unknown): string {
  return `${JSON.stringify(value, null, 2)}\n`;
}
