import { defined, isDefined, type Statistic } from '../hydrology/paired.ts';
import type { InputReference } from '../manifest/data.generated.ts';
import type { Records } from '../records/record.ts';
import type { FileIdentity, Snapshot } from '../repository/snapshot.ts';
import type { Series } from '../series/series.ts';
import { inputsNamed, layoutOf, seriesFilesOf, seriesOfInput } from './series-of.ts';
import { withStep } from './step-found.ts';

/** The series of an input that something refers to, and all that it depends on. */
export interface InputSeries {
  readonly reference: InputReference;
  /** Layouts, files and their blobs; JSON. */
  readonly from: unknown;
  /** Whether the input says its step. */
  readonly hasStep: boolean;
}

/** Why a series can't be read; `isAway` where the content of a file is not here, so that nobody is to blame. */
export interface Unusable {
  readonly undefined: string;
  readonly isAway: boolean;
}

export function contentAway(path: string): Unusable {
  return { undefined: `the content of ${path} is not here`, isAway: true };
}

/** Finds an input with all its files. */
export function findInput(
  reference: InputReference,
  records: Records,
): { readonly value: InputSeries } | Unusable {
  const holders = inputsNamed(reference.input, records);
  if (holders.length === 0) return { undefined: `there is no input ${reference.input}`, isAway: false };
  const from = holders.map((holder) => ({
    id: holder.id,
    layout: layoutOf(holder.fragment.series ?? {}),
    combine: holder.fragment.combine,
    files: seriesFilesOf(holder).map(({ path, identity }) => [path, identity.blob]),
  }));
  const files = holders.flatMap(seriesFilesOf);
  const away = files.find(({ identity }) => !isContentHere(identity));
  if (away !== undefined) return contentAway(away.path);
  const hasStep = holders.every(({ fragment }) => fragment.series?.step !== undefined);
  return defined({ reference, from: { from, ...reference }, hasStep });
}

/** Whether a file's content can be read; a Git LFS pointer alone can't. */
export function isContentHere(identity: FileIdentity): boolean {
  return identity.kind === 'file' || (identity.kind === 'pointer' && identity.present);
}

/** The series, in the step that is stated, or else the one that its times have. */
export async function readInputSeries(
  { reference, hasStep }: InputSeries,
  records: Records,
  snapshot: Snapshot,
): Promise<Statistic<Series>> {
  const series = await seriesOfInput(reference, records, snapshot);
  return isDefined(series) && !hasStep ? defined(withStep(series.value)) : series;
}
