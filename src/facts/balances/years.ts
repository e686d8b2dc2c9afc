import { total } from '../../hydrology/arithmetic.ts';
import { secondsOfDay } from '../../series/calendar.ts';
import { daysOfYear, type YearBegins, yearOf } from '../../series/hydrological-year.ts';
import { countStarts, type Span, startsIn } from '../../series/windows.ts';
import type { Amounts, Side } from './columns.ts';
import { type RowSpan, rowsIn } from './spans.ts';

/** The balance of one complete hydrological year. */
export interface YearOfBalance {
  readonly year: number;
  readonly inflow: number;
  readonly residual: number;
  /** By store: by how much it rose. */
  readonly stored: Readonly<Record<string, number>>;
}

/** The years that lie wholly in one stretch of rows and for which the stores before are known. */
export function yearsOf(
  columns: readonly Amounts[],
  rows: readonly RowSpan[],
  yearBegins: YearBegins,
): readonly YearOfBalance[] {
  const [any] = columns;
  if (any === undefined) return [];
  const { timeSeconds, step } = any.series;
  const stores = columns.filter(({ side }) => side === 'storage');
  const dayOf = (row: number) => Math.floor((timeSeconds[row] ?? 0) / secondsOfDay);
  const years: YearOfBalance[] = [];
  for (const { first, end } of rows)
    for (let year = yearOf(dayOf(first), yearBegins); year <= yearOf(dayOf(end - 1), yearBegins); year++) {
      const { firstDay, lastDay } = daysOfYear(year, yearBegins);
      const days: Span = {
        fromSeconds: firstDay * secondsOfDay,
        untilSeconds: (lastDay + 1) * secondsOfDay,
      };
      const span = startsIn(days, step, yearBegins);
      const within = rowsIn(timeSeconds, span);
      const isWhole =
        within.first >= first &&
        within.end <= end &&
        within.end - within.first === countStarts(span, timeSeconds[0] ?? 0, step);
      if (!isWhole || within.end === within.first || (within.first === 0 && stores.length > 0)) continue;
      const flow = (side: Side) =>
        total(
          columns
            .filter((column) => column.side === side)
            .map(({ series }) => total(series.values.subarray(within.first, within.end))),
        );
      const stored = Object.fromEntries(
        stores.map(({ name, series: { values } }) => [
          name,
          (values[within.end - 1] ?? 0) - (values[within.first - 1] ?? 0),
        ]),
      );
      const inflow = flow('inflow');
      const residual = inflow - flow('outflow') - total(Object.values(stored));
      years.push({ year, inflow, residual, stored });
    }
  return years;
}
