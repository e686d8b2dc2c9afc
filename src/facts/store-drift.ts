import { mean } from '../hydrology/arithmetic.ts';
import { defined, isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import { type MannKendall, mannKendall } from '../hydrology/trend/mann-kendall.ts';
import { type StoreDrift, storeDrift } from '../hydrology/warm-up/store-drift.ts';
import type { RecordNode, Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { yearOf } from '../series/hydrological-year.ts';
import { yearBeginsOf } from './catchment.ts';
import { nodesIn } from './nodes-in.ts';
import { findOutput } from './output.ts';
import { type RainYears, rainOfRun } from './rain-years.ts';
import { daysOf } from './scores/pairings.ts';
import { type StoreYears, storeYears, type YearlyStorage } from './store-years.ts';
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
  const yearly = await storeYears(output.value, firstDay, yearBegins, snapshot);
  if (!isDefined(yearly)) return { stores: yearly, rainTrend };
  const rainMm = years.length === 0 ? 0 : mean(years);
  return { stores: defined(yearly.value.map((store) => figuresOf(store, rainMm))), rainTrend };
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

function figuresOf({ store, isDepth, sameDate, annualMean }: StoreYears, rainMm: number): StoreFigures {
  const drift = ({ years, storage }: YearlyStorage): Statistic<Drift> => {
    const found = storeDrift({ years, storageMm: storage, annualRainfallMm: isDepth ? rainMm : 0 });
    return isDefined(found) ? defined({ ...found.value, years: years.length }) : found;
  };
  return { store, isDepth, sameDate: drift(sameDate), annualMean: drift(annualMean) };
}
