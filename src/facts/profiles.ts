import { defined, isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import { fromFolder } from '../records/paths.ts';
import type { RecordNode, Records } from '../records/record.ts';
import type { FileIdentity, Snapshot } from '../repository/snapshot.ts';
import type { Window } from '../series/calendar.ts';
import { parseStep, type Step } from '../series/step.ts';
import { areaKm2Of, yearBeginsOf } from './catchment.ts';
import { isContentHere } from './input.ts';
import { annualDepthMm } from './profiles/as-depth.ts';
import { comparisonsOf, type Held, incompleteTotalsOf } from './profiles/beside-others.ts';
import { coveredDays, coveredTogether } from './profiles/covered-days.ts';
import { type FileProfile, fileProfile, fileProfileVersion } from './profiles/file-profile.ts';
import type { IncompleteTotal } from './profiles/incomplete-totals.ts';
import { type ShareInTable, shareInTable } from './profiles/share-in-table.ts';
import { remembered } from './remembered.ts';
import { layoutOf, seriesFilesOf, seriesOfFile } from './series-of.ts';

type InputRecord = RecordNode<'inputs'>;

/** A file of an input, its content here, with what it holds. */
export interface ProfiledFile extends FileProfile {
  /** From the top of the repository, and from the manifest's folder. */
  readonly path: string;
  readonly name: string;
  /** First to last day; null without rows. */
  readonly days: Window | null;
}

/** What the files of one input with a series hold. */
export interface InputProfile {
  readonly files: readonly ProfiledFile[];
  /** Whether no file is missing. */
  readonly isComplete: boolean;
  /** Null where the input states none in a table. */
  readonly shareInTable: ShareInTable | null;
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
  const here = claims
    .filter(({ identity }) => isContentHere(identity))
    .map((claim) => ({ ...claim, name: fromFolder(records.manifest.folder, claim.path) }));
  const files: ProfiledFile[] = [];
  for (const { path, name, identity } of here) {
    const profile = await fileProfileOf(path, identity, input, snapshot);
    if (!isDefined(profile)) continue;
    const days = coveredDays(profile.value, step, yearBeginsOf(data));
    files.push({ ...profile.value, path, name, days });
  }
  const days = coveredTogether(
    files.flatMap((file) => file.days ?? []),
    fragment.combine,
  );
  return {
    files,
    isComplete: files.length === claims.length && elsewhere.length === 0,
    shareInTable: await shareInTable(input, records, snapshot),
    step,
    days,
    annualMm: annualMmOf(files, input, areaKm2Of(data)),
    comparisons: await comparisonsOf(
      input,
      here.map(({ name }) => name),
      records,
      snapshot,
    ),
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
): Promise<Statistic<FileProfile>> {
  const layout = layoutOf(series ?? {});
  const isRain = role === 'precipitation';
  const from = { blob: identity.blob, layout, isRain };
  return remembered(snapshot, { what: 'file profile', version: fileProfileVersion, from }, async () => {
    const table = await seriesOfFile(path, layout, snapshot);
    return table === null ? undefinedBecause('its content is not here') : defined(fileProfile(table, isRain));
  });
}

/** By the mean of all values, whatever their weights. */
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
