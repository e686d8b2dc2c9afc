import { isDefined } from '../../hydrology/paired.ts';
import { monthNumber, secondsOfDay } from '../../series/calendar.ts';
import { irregular } from '../../series/step.ts';
import type { SeriesTable } from '../../series/table.ts';
import { asDepth } from './as-depth.ts';
import { type Place, placeOf } from './places.ts';

/** The most rain that fell within a duration; `first` and `last` are its first and last step. */
export interface LargestAmount {
  readonly mm: number;
  readonly first: Place;
  readonly last: Place;
}

export interface RainExtremes {
  /** Within 24 hours in a row; null for steps longer than a day. */
  readonly day: LargestAmount | null;
  /** Within twelve months in a row (366 days); null for longer steps. */
  readonly year: LargestAmount | null;
}

/** Null where the unit gives no depth. Missing values count as dry, and negative ones too. */
export function rainExtremes(table: SeriesTable, values: Float64Array): RainExtremes | null {
  const { unit, timeSeconds } = table;
  const step = table.step ?? irregular;
  const depth = asDepth({ unit, step, timeSeconds, values });
  if (!isDefined(depth)) return null;
  const amounts = depth.value.values;
  const isShort = step.kind === 'seconds' && step.length <= secondsOfDay;
  return {
    day: isShort ? largest(table, amounts, seconds(secondsOfDay)) : null,
    year: largest(table, amounts, step.kind === 'months' ? twelveMonths : seconds(366 * secondsOfDay)),
  };
}

/** Whether two steps belong to one stretch of the duration. */
type Within = (firstSeconds: number, lastSeconds: number) => boolean;

const seconds =
  (duration: number): Within =>
  (first, last) =>
    last - first < duration;

const twelveMonths: Within = (first, last) => monthOf(last) - monthOf(first) < 12;

function monthOf(timeSeconds: number): number {
  return monthNumber(Math.floor(timeSeconds / secondsOfDay));
}

function largest(table: SeriesTable, amounts: Float64Array, within: Within): LargestAmount | null {
  const { timeSeconds } = table;
  let sum = 0;
  let first = 0;
  let most = { mm: 0, first: -1, last: -1 };
  for (let row = 0; row < amounts.length; row++) {
    sum += wet(amounts[row]);
    while (!within(timeSeconds[first] as number, timeSeconds[row] as number)) sum -= wet(amounts[first++]);
    if (sum > most.mm) most = { mm: sum, first, last: row };
  }
  if (most.first < 0) return null;
  return { mm: most.mm, first: placeOf(table, most.first), last: placeOf(table, most.last) };
}

function wet(amount: number | undefined): number {
  return amount !== undefined && amount > 0 ? amount : 0;
}
