import { mean } from '../hydrology/arithmetic.ts';
import { defined, isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import { type MannKendall, mannKendall } from '../hydrology/trend/mann-kendall.ts';
import { type StoreDrift, storeDrift } from '../hydrology/warm-up/store-drift.ts';
import type { RecordNode, Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { aggregate } from '../series/aggregate.ts';
import { secondsOfDay } from '../series/calendar.ts';
import { daysOfYear, type YearBegins, yearOf } from '../series/hydrological-year.ts';
import type { Series } from '../series/series.ts';
import { conversion } from '../series/units/conversion.ts';
import { yearBeginsOf } from './catchment.ts';
import { nodesIn } from './nodes-in.ts';
import { findOutput, readOutput } from './output.ts';
import { type RainYears, rainOfRun } from './rain-years.ts';
import { remembered } from './remembered.ts';
import { daysOf } from './scores/pairings.ts';
import { windowsOfRun } from './windows.ts';

/** How one store of a run moves from year to year after warm-up. */
export interface StoreFigures {
  /** The column's name. */
  readonly store: string;
  /** False where its unit is no depth, or is not stated: then its figures are in whatever unit it has, and not held against rain. */
  readonly isDepth: boolean;
  /** On the last day of each hydrological year, from the end of the warm-up on. */
  readonly sameDate: Statistic<Drift>;
  /** Means of the complete years after warm-up. */
  readonly annualMean: Statistic<Drift>;
}

export interface Drift extends StoreDrift {
  /** Values that it was computed from, one a year. */
  readonly years: number;
}

/** The stores of one run. */
export interface RunStores {
  readonly stores: Statistic<readonly StoreFigures[]>;
  /** Whether the rain of the same years rises or falls; undefined where it is not known. */
  readonly rainTrend: Statistic<MannKendall>;
}

const version = 1;

/** By run: its stores after warm-up; runs without stated stores or without a warm-up are left out. */
export async function storesOf(
  records: Records,
  rain: ReadonlyMap<string, Statistic<RainYears>>,
  snapshot: Snapshot,
): Promise<ReadonlyMap<string, RunStores>> {
  const found = new Map<string, RunStores>();
  for (const run of nodesIn(records.nodes, 'runs')) {
    const [warmUp] = daysOf(windowsOfRun(run, records), 'warm-up');
    if (run.fragment.stores?.file === undefined || warmUp === undefined) continue;
    found.set(run.name ?? '', await storesOfRun(run, warmUp.lastDay + 1, records, rain, snapshot));
  }
  return found;
}

async function storesOfRun(
  run: RecordNode<'runs'>,
  firstDay: number,
  records: Records,
  rain: ReadonlyMap<string, Statistic<RainYears>>,
  snapshot: Snapshot,
): Promise<RunStores> {
  const yearBegins = yearBeginsOf(records.manifest.data);
  const years = rainAfter(run, yearOf(firstDay, yearBegins), records, rain);
  const rainTrend =
    years.length < 5 ? undefinedBecause('the rain of too few years is known') : mannKendall(years);
  const output = await findOutput(run.fragment.stores ?? {}, records, snapshot);
  if ('undefined' in output) return { stores: output, rainTrend };
  const rainMm = years.length === 0 ? 0 : mean(years);
  const from = { output: output.value, firstDay, yearBegins, rainMm };
  const stores = await remembered(snapshot, { what: 'drift of stores', version, from }, async () => {
    const columns = await readOutput(output.value, snapshot);
    if (!isDefined(columns)) return columns;
    return defined(
      [...columns.value].map(([store, series]) => figuresOf(store, series, firstDay, yearBegins, rainMm)),
    );
  });
  return { stores, rainTrend };
}

/** Yearly rain in mm from a year on, of the first input of rain that the run takes. */
function rainAfter(
  run: RecordNode<'runs'>,
  firstYear: number,
  records: Records,
  rain: ReadonlyMap<string, Statistic<RainYears>>,
): readonly number[] {
  const known = rainOfRun(run, records)
    .map((input) => rain.get(input))
    .find((years) => years !== undefined && isDefined(years));
  if (known === undefined || !isDefined(known)) return [];
  const { years, totalsMm } = known.value;
  return totalsMm.filter((_, place) => (years[place] ?? 0) >= firstYear);
}

function figuresOf(
  store: string,
  series: Series,
  firstDay: number,
  yearBegins: YearBegins,
  rainMm: number,
): StoreFigures {
  const toMm = conversion({ from: series.unit, to: 'mm' });
  const factor = isDefined(toMm) ? toMm.value.factor : 1;
  const annualRainfallMm = isDefined(toMm) ? rainMm : 0;
  const drift = (yearly: readonly Yearly[]): Statistic<Drift> => {
    const found = storeDrift({
      years: yearly.map(({ year }) => year),
      storageMm: yearly.map(({ value }) => value * factor),
      annualRainfallMm,
    });
    return isDefined(found) ? defined({ ...found.value, years: yearly.length }) : found;
  };
  const rows = series.timeSeconds.filter((time) => time < firstDay * secondsOfDay).length;
  const after = {
    ...series,
    timeSeconds: series.timeSeconds.subarray(rows),
    values: series.values.subarray(rows),
  };
  return {
    store,
    isDepth: isDefined(toMm),
    sameDate: drift(onSameDate(series, firstDay, yearBegins)),
    annualMean: drift(
      aggregate(after, { by: 'year', how: 'mean', completeness: 'every-step', yearBegins }).flatMap(
        ({ label, value }) => (isDefined(value) ? [{ year: Number(label), value: value.value }] : []),
      ),
    ),
  };
}

interface Yearly {
  readonly year: number;
  readonly value: number;
}

/** The last value of each day on which a hydrological year ends, from the end of the warm-up on. */
function onSameDate(series: Series, firstDay: number, yearBegins: YearBegins): readonly Yearly[] {
  const found = new Map<number, number>();
  for (const [row, time] of series.timeSeconds.entries()) {
    const day = Math.floor(time / secondsOfDay);
    if (day < firstDay - 1) continue;
    const year = yearOf(day, yearBegins);
    const value = series.values[row] ?? Number.NaN;
    if (day === daysOfYear(year, yearBegins).lastDay && !Number.isNaN(value)) found.set(year, value);
  }
  return [...found].map(([year, value]) => ({ year, value }));
}
