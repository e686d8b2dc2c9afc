/**
 * Calendar month of a time.
 *
 * Formula: proleptic Gregorian calendar
 * Inputs: days since 1970-01-01, as in the times of pairs.
 * Range: 0 (January) to 11.
 * Read: which of the twelve means of a climatology a step belongs to.
 * Undefined: never for a finite time.
 * Source: ISO 8601.
 * Example: calendarMonth(31) -> 1
 */
export function calendarMonth(timeDays: number): number {
  return new Date(timeDays * 86_400_000).getUTCMonth();
}
