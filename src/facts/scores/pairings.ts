import { isDefined, type Paired, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import { dayNumber } from '../../manifest/period.ts';
import { secondsOfDay, type Window } from '../../series/calendar.ts';
import { pairByDate } from '../../series/pair.ts';
import type { StatedWindow } from '../windows.ts';
import { type Comparison, comparable, type Sides } from './comparable.ts';
import type { ScoredWindow } from './stated.ts';

/** Two series as they are read, how they are compared, and over which windows. */
export interface Pairable {
  readonly sides: Sides;
  readonly comparison: Comparison;
  readonly windows: readonly StatedWindow[];
}

/** The days of the windows of a kind. */
export function daysOf(windows: readonly StatedWindow[], kind: StatedWindow['kind']): readonly Window[] {
  return windows
    .filter((window) => window.kind === kind)
    .map(({ period: { first, last } }) => ({ firstDay: dayNumber(first), lastDay: dayNumber(last) }));
}

/** The pairs of a window, warm-up kept out; all its parts together. */
export function pairsOf(pairable: Pairable, window: ScoredWindow): Statistic<Paired> {
  const days = daysOf(pairable.windows, window);
  if (days.length === 0) return undefinedBecause(`no ${window} window is stated`);
  return pairedOver(pairable, days, daysOf(pairable.windows, 'warm-up'));
}

/** The pairs of any days. */
export function pairedOver(
  { sides, comparison }: Pairable,
  windows: readonly Window[],
  leftOut: readonly Window[],
): Statistic<Paired> {
  const brought = comparable(sides, comparison);
  return isDefined(brought) ? pairByDate({ ...brought.value, windows, leftOut, ...comparison }) : brought;
}

/** From the first to the last day that the model gives anything for. */
export function simulatedDays({ simulated }: Sides): readonly Window[] {
  const { timeSeconds } = simulated;
  const [first, last] = [timeSeconds[0], timeSeconds.at(-1)];
  if (first === undefined || last === undefined) return [];
  // A step of a month or a year reaches beyond its first day.
  const reach = simulated.step.kind === 'months' ? 31 * simulated.step.length : 1;
  return [{ firstDay: Math.floor(first / secondsOfDay), lastDay: Math.floor(last / secondsOfDay) + reach }];
}
