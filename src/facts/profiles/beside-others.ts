import { defined, isDefined, type Statistic } from '../../hydrology/paired.ts';
import type { InputReference } from '../../manifest/data.generated.ts';
import type { RecordNode, Records } from '../../records/record.ts';
import type { Snapshot } from '../../repository/snapshot.ts';
import type { Series } from '../../series/series.ts';
import { parseStep } from '../../series/step.ts';
import { areaKm2Of, yearBeginsOf } from '../catchment.ts';
import { findInput, readInputSeries } from '../input.ts';
import { type Basis, remembered } from '../remembered.ts';
import { inputsNamed, seriesFilesOf } from '../series-of.ts';
import { type Comparison, comparisonOf, comparisonVersion } from './comparison.ts';
import { type IncompleteTotal, incompleteTotals, incompleteTotalsVersion } from './incomplete-totals.ts';

type InputRecord = RecordNode<'inputs'>;

/** A comparison with the reference that the input names. */
export interface Held {
  /** The file that is compared alone, of an input with several; null for what the files make together. */
  readonly file: string | null;
  /** The record id of the reference. */
  readonly reference: string;
  readonly outcome: Statistic<Comparison>;
}

/** The comparisons of an input with the reference that it names; none where content of either is not here. */
export async function comparisonsOf(
  { name, fragment }: InputRecord,
  files: readonly string[],
  records: Records,
  snapshot: Snapshot,
): Promise<readonly Held[]> {
  const { role = 'other', combine, compare_with } = fragment;
  if (compare_with === undefined) return [];
  const { data } = records.manifest;
  const areaKm2 = areaKm2Of(data);
  const settings = { role, yearBegins: yearBeginsOf(data), over: areaKm2 === null ? {} : { areaKm2 } };
  // Files that follow one another are one series; gauges side by side may each have a fault of their own.
  const alone = combine === undefined || files.length === 1 ? [] : files;
  const together = alone.length > 0 && combine === 'each' ? [] : [null];
  const held: Held[] = [];
  for (const file of [...together, ...alone]) {
    const checked: InputReference = { input: name ?? '', ...(file === null ? {} : { file }) };
    const outcome = await ofTwo(checked, compare_with, records, snapshot, {
      basis: { what: 'comparison', version: comparisonVersion, from: settings },
      compute: (one, other) => comparisonOf({ ...settings, checked: one, reference: other }),
    });
    if (outcome !== null) held.push({ file, reference: `inputs.${compare_with.input}`, outcome });
  }
  return held;
}

/** By record id of each finer input that a monthly or yearly one names (in `rests_on` or `compare_with`): figures made from too few steps. */
export async function incompleteTotalsOf(
  { name, fragment }: InputRecord,
  records: Records,
  snapshot: Snapshot,
): Promise<ReadonlyMap<string, readonly IncompleteTotal[]>> {
  const found = new Map<string, readonly IncompleteTotal[]>();
  if (parseStep(fragment.series?.step ?? '')?.kind !== 'months') return found;
  const yearBegins = yearBeginsOf(records.manifest.data);
  const named = [fragment.compare_with?.input ?? [], ...(fragment.rests_on ?? []).flatMap(inputIn)].flat();
  for (const input of new Set(named)) {
    const outcome = await ofTwo({ input: name ?? '' }, { input }, records, snapshot, {
      basis: { what: 'incomplete totals', version: incompleteTotalsVersion, from: { yearBegins } },
      compute: (coarse, fine) => defined(incompleteTotals({ coarse, fine, yearBegins })),
    });
    if (outcome !== null && isDefined(outcome) && outcome.value.length > 0)
      found.set(`inputs.${input}`, outcome.value);
  }
  return found;
}

function inputIn(record: string): readonly string[] {
  return record.startsWith('inputs.') ? [record.slice('inputs.'.length)] : [];
}

/** What is computed from the series of two inputs; null where either is unknown or content of it is not here. */
async function ofTwo<T>(
  one: InputReference,
  other: InputReference,
  records: Records,
  snapshot: Snapshot,
  { basis, compute }: { readonly basis: Basis; compute(one: Series, other: Series): Statistic<T> },
): Promise<Statistic<T> | null> {
  const found = findInput(one, records);
  const foundOther = findInput(other, records);
  const hasFiles = inputsNamed(other.input, records).some((input) => seriesFilesOf(input).length > 0);
  if (!('value' in found && 'value' in foundOther && hasFiles)) return null;
  const from = { settings: basis.from, one: found.value.from, other: foundOther.value.from };
  return remembered(snapshot, { ...basis, from }, async () => {
    const series = await readInputSeries(found.value, records, snapshot);
    if (!isDefined(series)) return series;
    const reference = await readInputSeries(foundOther.value, records, snapshot);
    return isDefined(reference) ? compute(series.value, reference.value) : reference;
  });
}
