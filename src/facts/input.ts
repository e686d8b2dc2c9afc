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

/** Why content is not here: git holds no such file, or a link that leads to none, or holds it elsewhere (LFS, a partial clone). */
export type Away = 'not-in-git' | 'link' | 'not-fetched';

/** Why a series can't be read; `away` where the content of a file is not here, so that nothing can be said of it. */
export interface Unusable {
  readonly undefined: string;
  readonly away: Away | null;
}

export function contentAway(path: string, identity: FileIdentity | undefined): Unusable {
  const away = awayBy(identity);
  const reasons: Readonly<Record<Away, string>> = {
    'not-in-git': `git holds no file ${path}`,
    link: `${path} is a link that leads to no file of the repository`,
    'not-fetched': `the content of ${path} is not here`,
  };
  return { undefined: reasons[away], away };
}

/** How content is away that is not here. */
export function awayBy(identity: FileIdentity | undefined): Away {
  const why = identity?.kind === 'unavailable' ? identity.why : identity === undefined ? 'absent' : null;
  if (why === 'absent' || why === 'intent-to-add') return 'not-in-git';
  return why === 'link-outside' || why === 'link-dangling' ? 'link' : 'not-fetched';
}

/** Finds an input with all its files. */
export function findInput(
  reference: InputReference,
  records: Records,
): { readonly value: InputSeries } | Unusable {
  const holders = inputsNamed(reference.input, records);
  if (holders.length === 0) return { undefined: `there is no input ${reference.input}`, away: null };
  const from = holders.map((holder) => ({
    id: holder.id,
    layout: layoutOf(holder.fragment.series ?? {}),
    combine: holder.fragment.combine,
    files: seriesFilesOf(holder).map(({ path, identity }) => [path, identity.blob]),
  }));
  const files = holders.flatMap(seriesFilesOf);
  const away = files.find(({ identity }) => !isContentHere(identity));
  if (away !== undefined) return contentAway(away.path, away.identity);
  if (files.length === 0 && holders.some(({ elsewhere }) => elsewhere.length > 0))
    return { undefined: `the files of inputs.${reference.input} are kept outside git`, away: 'not-in-git' };
  const hasStep = holders.every(({ fragment }) => fragment.series?.step !== undefined);
  // A reference names a file as seen from the manifest's folder.
  const { folder } = records.manifest;
  return defined({ reference, from: { from, folder, ...reference }, hasStep });
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
