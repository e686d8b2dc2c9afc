// What the schema's `format` means; the validators made at build call these by name.
import { isDate, parsePeriod } from './period.ts';

export const date = isDate;

export function period(text: string): boolean {
  return parsePeriod(text) !== null;
}
