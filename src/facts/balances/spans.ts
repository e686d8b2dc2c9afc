import { defined, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import type { YearBegins } from '../../series/hydrological-year.ts';
import type { Series } from '../../series/series.ts';
import { afterSteps, formatTime, type Step } from '../../series/step.ts';
import { countStarts, type Span, spansOf, startsIn } from '../../series/windows.ts';
import type { Days } from '../over.ts';

/** Rows from `first` up to, not including, `end`. */
export interface RowSpan {
  readonly first: number;
  readonly end: number;
}

/** The rows of each stretch of days. Undefined where steps are absent, or a series has none. */
export function rowsOver(
  { timeSeconds, step }: Series,
  { windows, leftOut }: Days,
  yearBegins: YearBegins,
): Statistic<readonly RowSpan[]> {
  if (step.kind === 'irregular') return undefinedBecause('its times have no regular step (`step`)');
  const origin = timeSeconds[0] ?? 0;
  const rows: RowSpan[] = [];
  for (const days of spansOf(windows, leftOut)) {
    const span = startsIn(days, step, yearBegins);
    const found = rowsIn(timeSeconds, span);
    const steps = countStarts(span, origin, step);
    const absent = steps - (found.end - found.first);
    if (steps === 0) return undefinedBecause('the window holds no whole step of it');
    if (absent > 0) return undefinedBecause(`${absent} of the ${steps} steps of the window are not in it`);
    rows.push(found);
  }
  return rows.length === 0 ? undefinedBecause('no days are left without the warm-up') : defined(rows);
}

export function rowsIn(timeSeconds: Float64Array, { fromSeconds, untilSeconds }: Span): RowSpan {
  return { first: firstAt(timeSeconds, fromSeconds), end: firstAt(timeSeconds, untilSeconds) };
}

/** Whether the row before another is the step before it, so that it holds what was stored when the other began. */
export function followsOn(timeSeconds: Float64Array, row: number, step: Step): boolean {
  const [before, time] = [timeSeconds[row - 1], timeSeconds[row]];
  return before !== undefined && time !== undefined && afterSteps(before, 1, step) === time;
}

/** The first and the last step of rows, as people write them. */
export function toldSteps({ timeSeconds, step }: Series, rows: readonly RowSpan[]): [string, string] {
  const told = (row: number) => formatTime(timeSeconds[row] ?? 0, step);
  return [told(rows[0]?.first ?? 0), told((rows.at(-1)?.end ?? 1) - 1)];
}

function firstAt(times: Float64Array, from: number): number {
  let [low, high] = [0, times.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((times[middle] as number) < from) low = middle + 1;
    else high = middle;
  }
  return low;
}
