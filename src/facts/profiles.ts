import { defined, isDefined, type Statistic } from '../hydrology/paired.ts';
import type { InputReference } from '../manifest/data.generated.ts';
import { fromFolder } from '../records/paths.ts';
import { type RecordNode, type Records, sha256Of } from '../records/record.ts';
import type { FileIdentity, Snapshot } from '../repository/snapshot.ts';
import type { Window } from '../series/calendar.ts';
import type { Series } from '../series/series.ts';
import { parseStep, type Step } from '../series/step.ts';
import { areaKm2Of, yearBeginsOf } from './catchment.ts';
import { findInput, isContentHere, readInputSeries } from './input.ts';
import { annualDepthMm } from './profiles/as-depth.ts';
import { type Comparison, comparisonOf, comparisonVersion } from './profiles/comparison.ts';
import { coveredDays, coveredTogether } from './profiles/covered-days.ts';
import { type FileProfile, fileProfile, fileProfileVersion } from './profiles/file-profile.ts';
import {
  type IncompleteTotal,
  incompleteTotals,
  incompleteTotalsVersion,
} from './profiles/incomplete-totals.ts';
import { type Basis, remembered } from './remembered.ts';
import { inputsNamed, layoutOf, seriesFilesOf, seriesOfFile } from './series-of.ts';

type InputRecord = RecordNode<'inputs'>;

/** A file of an input, its content here, with what it holds. */
export interface ProfiledFile extends FileProfile {
  /** From the top of the repository, and from the manifest's folder. */
  readonly path: string;
  readonly name: string;
  /** First to last day; null without rows. */
  readonly days: Window | null;
}

/** A comparison with the reference that the input names. */
export interface Held {
  /** The file that is compared, where each is a series of its own; null for what the files make together. */
  readonly file: string | null;
  /** The record id of the reference. */
  readonly reference: string;
  readonly outcome: Statistic<Comparison>;
}

/** What the files of one input with a series hold. */
export interface InputProfile {
  readonly files: readonly ProfiledFile[];
  /** Whether no file is missing. */
  readonly isComplete: boolean;
  /** Null where no step is stated. */
  readonly step: Step | null;
  /** The days that the files cover together (`coveredTogether`); null where there are none. */
  readonly days: Window | null;
  /** The mean annual depth of precipitation, evapotranspiration or flow over the catchment in mm; null where it can't be told. */
  readonly annualMm: number | null;
  /** With the reference that the input names; none where content of either is not here. */
  readonly comparisons: readonly Held[];
  /** By record id of a finer input: months or years made from too few of its steps. */
  readonly incompleteTotals: ReadonlyMap<string, readonly IncompleteTotal[]>;
}

/** By name: every input that says how its files hold a series, and has at least one of them here. */
export async function profilesOf(
  records: Records,
  snapshot: Snapshot,
): Promise<ReadonlyMap<string, InputProfile>> {
  const profiles = new Map<string, InputProfile>();
  for (const node of records.nodes.values()) {
    const input = node.area === 'inputs' ? (node as InputRecord) : null;
    if (input?.name == null || input.fragment.series === undefined) continue;
    const profile = await profileOf(input, records, snapshot);
    if (profile.files.length > 0) profiles.set(input.name, profile);
  }
  return profiles;
}

async function profileOf(input: InputRecord, records: Records, snapshot: Snapshot): Promise<InputProfile> {
  const { fragment, elsewhere } = input;
  const { data } = records.manifest;
  const step = stepOf(input);
  const claims = seriesFilesOf(input);
  const files: ProfiledFile[] = [];
  for (const { path, identity } of claims) {
    const profile = isContentHere(identity) ? await fileProfileOf(path, identity, input, snapshot) : null;
    if (profile === null) continue;
    const name = fromFolder(records.manifest.folder, path);
    files.push({ ...profile, path, name, days: coveredDays(profile, step, yearBeginsOf(data)) });
  }
  const days = coveredTogether(
    files.flatMap((file) => file.days ?? []),
    fragment.combine,
  );
  return {
    files,
    isComplete: files.length === claims.length && elsewhere.length === 0,
    step,
    days,
    annualMm: annualMmOf(files, input, areaKm2Of(data)),
    comparisons: await comparisonsOf(input, files, records, snapshot),
    incompleteTotals: await incompleteTotalsOf(input, records, snapshot),
  };
}

function stepOf({ fragment }: InputRecord): Step | null {
  return parseStep(fragment.series?.step ?? '');
}

function fileProfileOf(
  path: string,
  identity: FileIdentity,
  { fragment: { role, series } }: InputRecord,
  snapshot: Snapshot,
): Promise<FileProfile | null> {
  const layout = layoutOf(series ?? {});
  const isRain = role === 'precipitation';
  const from = { sha256: sha256Of(identity), layout, isRain };
  return remembered(snapshot, { what: 'file profile', version: fileProfileVersion, from }, async () => {
    const table = await seriesOfFile(path, layout, snapshot);
    return table === null ? null : fileProfile(table, isRain);
  });
}

function annualMmOf(
  files: readonly FileProfile[],
  { fragment: { role, combine, series } }: InputRecord,
  areaKm2: number | null,
): number | null {
  if (role !== 'precipitation' && role !== 'evapotranspiration' && role !== 'streamflow') return null;
  const columns = files.flatMap((file) => file.columns);
  const values = columns.reduce((count, column) => count + column.values, 0);
  if (values === 0) return null;
  const mean = columns.reduce((sum, column) => sum + column.total, 0) / values;
  const together = combine === 'sum' ? mean * columns.length : mean;
  return annualDepthMm(
    { mean: together, unit: series?.unit ?? '', step: parseStep(series?.step ?? '') },
    areaKm2 === null ? {} : { areaKm2 },
  );
}

async function comparisonsOf(
  { name, fragment }: InputRecord,
  files: readonly ProfiledFile[],
  records: Records,
  snapshot: Snapshot,
): Promise<readonly Held[]> {
  const { role = 'other', combine, compare_with } = fragment;
  if (compare_with === undefined) return [];
  const { data } = records.manifest;
  const areaKm2 = areaKm2Of(data);
  const settings = { role, yearBegins: yearBeginsOf(data), over: areaKm2 === null ? {} : { areaKm2 } };
  const alone = combine === 'each' && files.length > 1 ? files.map((file) => file.name) : [null];
  const held: Held[] = [];
  for (const file of alone) {
    const checked: InputReference = { input: name ?? '', ...(file === null ? {} : { file }) };
    const outcome = await ofTwo(checked, compare_with, records, snapshot, {
      basis: { what: 'comparison', version: comparisonVersion, from: settings },
      compute: (one, other) => comparisonOf({ ...settings, checked: one, reference: other }),
    });
    if (outcome !== null) held.push({ file, reference: `inputs.${compare_with.input}`, outcome });
  }
  return held;
}

/** Finer inputs that this one names: what it rests on, and what it is compared with. */
async function incompleteTotalsOf(
  { name, fragment }: InputRecord,
  records: Records,
  snapshot: Snapshot,
): Promise<InputProfile['incompleteTotals']> {
  const found = new Map<string, readonly IncompleteTotal[]>();
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
