import { defined, isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import type { RecordNode, Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { type BalanceBasis, balanceOf, type RecomputedBalance } from './balances/balance-of.ts';
import { type Amounts, columnsOf, inOneUnit, unitOfTotals } from './balances/columns.ts';
import { areaKm2Of, yearBeginsOf } from './catchment.ts';
import type { Figure } from './figures.ts';
import type { Away, Unusable } from './input.ts';
import { nodesIn } from './nodes-in.ts';
import { findOutput, type OutputFile, readOutput } from './output.ts';
import { type Days, daysOver } from './over.ts';
import { remembered } from './remembered.ts';
import { type ComparedFigure, compareFigures, figuresOf, withWindows } from './stated-figure.ts';
import { windowsOfRun } from './windows.ts';

type Volume = RecordNode<'balance'>;

/** The water balance of one control volume: what its files give, and what is stated. */
export interface VolumeFigures {
  readonly record: string;
  readonly recomputed: Statistic<RecomputedBalance>;
  /** Where a file's content is not here, so that nothing can be said: why. */
  readonly away: Away | null;
  readonly stated: readonly ComparedFigure[];
}

/** Raised whenever the same files may give another figure. */
export const balancesVersion = 1;

/** By the name of the volume. Those of unchanged files and windows are remembered. */
export async function balancesOf(
  records: Records,
  snapshot: Snapshot,
): Promise<ReadonlyMap<string, VolumeFigures>> {
  const found = new Map<string, VolumeFigures>();
  for (const volume of nodesIn(records.nodes, 'balance'))
    found.set(volume.name ?? '', await figuresOfVolume(volume, records, snapshot));
  return found;
}

async function figuresOfVolume(volume: Volume, records: Records, snapshot: Snapshot): Promise<VolumeFigures> {
  const { manifest } = records;
  const subject = await subjectOf(volume, records, snapshot);
  const base = [...volume.field, 'stated'];
  const compared = (of: Statistic<RecomputedBalance>) =>
    compareFigures(volume.fragment.stated, base, isDefined(of) ? balanceFigures(of.value) : of, manifest);
  if ('undefined' in subject)
    return { record: volume.id, recomputed: subject, away: subject.away, stated: compared(subject) };
  const { days, from, basis } = subject.value;
  const recomputed = await remembered(
    snapshot,
    { what: 'water balance', version: balancesVersion, from: { ...from, days } },
    async () => {
      const read = await basis();
      return isDefined(read) ? balanceOf(read.value, days) : read;
    },
  );
  const stated = compared(recomputed);
  const isClear = stated.every(({ agrees }) => agrees) || !isDefined(recomputed);
  const elsewhere = isClear ? new Map() : await overOtherWindows(volume, records, await basis());
  return { record: volume.id, recomputed, away: null, stated: withWindows(stated, elsewhere) };
}

interface Subject {
  readonly days: Days;
  /** All that the balance depends on besides; JSON. */
  readonly from: object;
  basis(): Promise<Statistic<BalanceBasis>>;
}

async function subjectOf(
  volume: Volume,
  records: Records,
  snapshot: Snapshot,
): Promise<{ readonly value: Subject } | Unusable> {
  const { fragment } = volume;
  const { data } = records.manifest;
  const columns = columnsOf(fragment);
  const withoutFlow = (['inflow', 'outflow'] as const).filter((side) =>
    columns.every((one) => one.side !== side),
  );
  if (withoutFlow.length > 0) return { undefined: `it names no ${withoutFlow.join(' and no ')}`, away: null };
  const values = [...new Set(columns.map(({ column }) => column))];
  const { unit: _, ...layout } = fragment;
  const output = await findOutput({ ...layout, values }, records, snapshot);
  if ('undefined' in output) return output;
  const run = runOf(volume, records);
  const over = daysOver(fragment.over ?? 'simulation', run, windowsOfRun(run, records), data);
  if (!isDefined(over)) return { ...over, away: null };
  const areaKm2 =
    fragment.area === undefined
      ? areaKm2Of(data)
      : areaKm2Of({ ...data, catchment: { area: fragment.area } });
  const unit = unitOfTotals(fragment.unit);
  if (!isDefined(unit)) return { ...unit, away: null };
  const settings = {
    unit: unit.value,
    yearBegins: yearBeginsOf(data),
    storageBefore: fragment.storage_before,
  };
  return defined({
    days: over.value,
    from: { output: output.value, columns, ownUnit: fragment.unit, areaKm2, ...settings },
    async basis() {
      const read = await readColumns(output.value, columns, values, snapshot);
      if (!isDefined(read)) return read;
      const brought = inOneUnit(read.value, fragment.unit, areaKm2);
      return isDefined(brought) ? defined({ columns: brought.value, ...settings }) : brought;
    },
  });
}

async function readColumns(
  output: OutputFile,
  columns: ReturnType<typeof columnsOf>,
  values: readonly (string | number)[],
  snapshot: Snapshot,
): Promise<Statistic<readonly Amounts[]>> {
  const read = await readOutput(output, snapshot);
  if (!isDefined(read)) return read;
  const inOrder = [...read.value.values()];
  const amounts = columns.flatMap((column) => {
    const series = inOrder[values.indexOf(column.column)];
    return series === undefined ? [] : [{ ...column, series }];
  });
  return inOrder.length === values.length && amounts.length === columns.length
    ? defined(amounts)
    : undefinedBecause(`a column of ${output.path} is named twice, by its name and by its place`);
}

function runOf({ fragment }: Volume, { nodes }: Records): RecordNode<'runs'> | undefined {
  return nodes.get(`runs.${fragment.run}`) as RecordNode<'runs'> | undefined;
}

/** The figures over windows with which the stated one is easily mixed up. */
async function overOtherWindows(
  volume: Volume,
  records: Records,
  basis: Statistic<BalanceBasis>,
): Promise<ReadonlyMap<string, ReadonlyMap<string, Statistic>>> {
  const found = new Map<string, ReadonlyMap<string, Statistic>>();
  if (!isDefined(basis)) return found;
  const run = runOf(volume, records);
  const windows = windowsOfRun(run, records);
  const others = {
    'the simulation without its warm-up': daysOver('simulation', run, windows, records.manifest.data),
    calibration: daysOver('calibration', run, windows, records.manifest.data),
    validation: daysOver('validation', run, windows, records.manifest.data),
    'the simulation with its warm-up': daysOver('simulation', run, [], records.manifest.data),
  };
  for (const [window, days] of Object.entries(others)) {
    if (!isDefined(days)) continue;
    const balance = balanceOf({ ...basis.value, storageBefore: basis.value.storageBefore ?? 0 }, days.value);
    if (isDefined(balance)) found.set(window, balanceFigures(balance.value));
  }
  return found;
}

/** What a record may state, by the same names; totals as `totals` and the term's name. */
export function balanceFigures(balance: RecomputedBalance): ReadonlyMap<string, Statistic> {
  const { storageChangeMm: change } = balance;
  return new Map<string, Statistic>([
    ['residual_share', balance.residualShare],
    ['runoff_ratio', balance.runoffRatio],
    ['evaporative_ratio', balance.evaporativeRatio],
    ['aridity', balance.aridity],
    ['storage_change', change === null ? undefinedBecause('no storage is named') : defined(change)],
    ...balance.terms
      .filter(({ side }) => side !== 'potential')
      .map((term): [string, Statistic] => [`totals ${term.name}`, defined(term.total)]),
  ]);
}

/** What is written for a volume that states nothing, with its decimals. */
const usual = { residual_share: 4, runoff_ratio: 3, evaporative_ratio: 3, aridity: 3, storage_change: 1 };

/** Figures of balances that the files give otherwise, and those of volumes that state none. */
export function balanceFiguresToWrite({
  records,
  balances,
}: {
  readonly records: Records;
  readonly balances: ReadonlyMap<string, VolumeFigures>;
}): readonly Figure[] {
  return nodesIn(records.nodes, 'balance').flatMap((volume) => {
    const figures = balances.get(volume.name ?? '');
    if (figures === undefined || !isDefined(figures.recomputed)) return [];
    const found = balanceFigures(figures.recomputed.value);
    return figuresOf(volume, [...volume.field, 'stated'], figures.stated, found, usual);
  });
}
