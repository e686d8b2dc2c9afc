import { defined, isDefined, type Statistic } from '../hydrology/paired.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { aggregate } from '../series/aggregate.ts';
import { secondsOfDay } from '../series/calendar.ts';
import { daysOfYear, type YearBegins, yearOf } from '../series/hydrological-year.ts';
import type { Series } from '../series/series.ts';
import { conversion } from '../series/units/conversion.ts';
import { type OutputFile, readOutput } from './output.ts';
import { remembered } from './remembered.ts';

/** What one store holds, a value for each hydrological year; in mm where its unit is a depth. */
export interface StoreYears {
  /** The column's name. */
  readonly store: string;
  readonly isDepth: boolean;
  /** On the last day of each year, from the day before `firstDay` on. */
  readonly sameDate: YearlyStorage;
  /** Means of the complete years from `firstDay` on. */
  readonly annualMean: YearlyStorage;
}

/** Year beside storage. */
export interface YearlyStorage {
  readonly years: readonly number[];
  readonly storage: readonly number[];
}

const version = 1;

/** The stores in an output, from a day (since 1970-01-01) on; undefined where it can't be read. */
export function storeYears(
  output: OutputFile,
  firstDay: number,
  yearBegins: YearBegins,
  snapshot: Snapshot,
): Promise<Statistic<readonly StoreYears[]>> {
  const from = { output, firstDay, yearBegins };
  return remembered(snapshot, { what: 'years of stores', version, from }, async () => {
    const columns = await readOutput(output, snapshot);
    if (!isDefined(columns)) return columns;
    return defined([...columns.value].map(([store, series]) => yearsOf(store, series, firstDay, yearBegins)));
  });
}

function yearsOf(store: string, series: Series, firstDay: number, yearBegins: YearBegins): StoreYears {
  const toMm = conversion({ from: series.unit, to: 'mm' });
  const factor = isDefined(toMm) ? toMm.value.factor : 1;
  const yearly = (values: ReadonlyMap<number, number>): YearlyStorage => ({
    years: [...values.keys()],
    storage: [...values.values()].map((value) => value * factor),
  });
  const rows = series.timeSeconds.filter((time) => time < firstDay * secondsOfDay).length;
  const after = {
    ...series,
    timeSeconds: series.timeSeconds.subarray(rows),
    values: series.values.subarray(rows),
  };
  const means = aggregate(after, { by: 'year', how: 'mean', completeness: 'every-step', yearBegins });
  return {
    store,
    isDepth: isDefined(toMm),
    sameDate: yearly(onSameDate(series, firstDay, yearBegins)),
    annualMean: yearly(
      new Map(
        means.flatMap(({ label, value }) =>
          isDefined(value) ? [[Number(label), value.value] as const] : [],
        ),
      ),
    ),
  };
}

/** The last value of each day on which a hydrological year ends, by year. */
function onSameDate(series: Series, firstDay: number, yearBegins: YearBegins): ReadonlyMap<number, number> {
  const found = new Map<number, number>();
  for (const [row, time] of series.timeSeconds.entries()) {
    const day = Math.floor(time / secondsOfDay);
    if (day < firstDay - 1) continue;
    const year = yearOf(day, yearBegins);
    const value = series.values[row] ?? Number.NaN;
    if (day === daysOfYear(year, yearBegins).lastDay && !Number.isNaN(value)) found.set(year, value);
  }
  return found;
}
