import { defined, isDefined, type Statistic } from '../hydrology/paired.ts';
import type { RecordNode, Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { aggregate } from '../series/aggregate.ts';
import { convertSeries } from '../series/convert-series.ts';
import { yearBeginsOf } from './catchment.ts';
import { findInput, readInputSeries } from './input.ts';
import { nodesIn } from './nodes-in.ts';
import { remembered } from './remembered.ts';
import { inputsTakenBy } from './taken-inputs.ts';

/** The rain of each complete hydrological year, step beside step. */
export interface RainYears {
  /** Named by the calendar year in which they end. */
  readonly years: readonly number[];
  readonly totalsMm: readonly number[];
  /** Years that have no total, since a total needs every step, with the steps that are missing. */
  readonly leftOut: readonly { readonly year: number; readonly missing: number; readonly steps: number }[];
}

const version = 2;

/** By name: the yearly rain of every precipitation input; undefined where its content is not here, or has no unit of rain. */
export async function rainYearsOf(
  records: Records,
  snapshot: Snapshot,
): Promise<ReadonlyMap<string, Statistic<RainYears>>> {
  const found = new Map<string, Statistic<RainYears>>();
  for (const { name, fragment } of nodesIn(records.nodes, 'inputs'))
    if (name !== null && fragment.role === 'precipitation')
      found.set(name, await rainYears(name, records, snapshot));
  return found;
}

/** The precipitation inputs that a run takes, by name. */
export function rainOfRun(run: RecordNode<'runs'> | undefined, records: Records): readonly string[] {
  return inputsTakenBy(run, records).flatMap(({ name, fragment }) =>
    fragment.role === 'precipitation' ? (name ?? []) : [],
  );
}

async function rainYears(input: string, records: Records, snapshot: Snapshot): Promise<Statistic<RainYears>> {
  const found = findInput({ input }, records);
  if ('undefined' in found) return found;
  const yearBegins = yearBeginsOf(records.manifest.data);
  const basis = { what: 'rain of years', version, from: { input: found.value.from, yearBegins } };
  return remembered(snapshot, basis, async () => {
    const series = await readInputSeries(found.value, records, snapshot);
    if (!isDefined(series)) return series;
    const inMm = convertSeries(series.value, 'mm');
    if (!isDefined(inMm)) return inMm;
    const groups = aggregate(inMm.value, {
      by: 'year',
      how: 'total',
      completeness: 'every-step',
      yearBegins,
    });
    const complete = groups.flatMap(({ label, value }) =>
      isDefined(value) ? [{ year: Number(label), total: value.value }] : [],
    );
    const leftOut = groups.flatMap(({ label, value, missing, steps }) =>
      isDefined(value) ? [] : [{ year: Number(label), missing, steps }],
    );
    return defined({
      years: complete.map(({ year }) => year),
      totalsMm: complete.map(({ total }) => total),
      leftOut,
    });
  });
}
