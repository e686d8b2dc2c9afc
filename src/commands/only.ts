import { posix } from 'node:path';
import { Failure } from '../failure.ts';
import { discoverManifests, governing } from '../manifest/discover.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { Study, Unread } from './studies.ts';

/** What `--only` chose: some manifests, and of their findings those of some records. */
export interface Chosen {
  readonly studies: readonly (Study | Unread)[];
  /** Whether a record is among those asked about. */
  readonly includes: (record: string) => boolean;
}

/**
 * What was typed after `--only`, a path as it is from the top of the repository. A path counts from the folder `here` where it was
 * typed; one that leads to no manifest from there, from the top. `.` and what begins with it may also lie within what a manifest
 * governs.
 */
export function onlyFromTop<Typed extends string | undefined>(
  only: Typed,
  here: string,
  { entries }: Pick<Snapshot, 'entries'>,
): Typed | string {
  if (!only) return only;
  const manifests = discoverManifests(entries.keys());
  const leads = (path: string): boolean => manifests.some((manifest) => isWithin(manifest.path, path));
  const fromHere = normal(posix.join(here, only));
  if (leads(fromHere)) return fromHere;
  if (!/^\.\.?(\/|$)/.test(only)) return normal(only);
  if (fromHere.startsWith('..')) return only;
  const manifest = governing(`${fromHere}/`, manifests);
  return manifest === undefined ? only : manifest.folder || '.';
}

function normal(path: string): string {
  return posix.normalize(path).replace(/(?<=.)\/+$/, '');
}

function isWithin(path: string, folder: string): boolean {
  return folder === '.' || path === folder || path.startsWith(`${folder}/`);
}

/** Reads `--only`, from the top: a manifest's folder (or the manifest itself), a record, or an area. Throws Failure 'usage' when it is none of them. */
export function choose(all: readonly (Study | Unread)[], only: string | undefined): Chosen {
  if (only === undefined) return { studies: all, includes: () => true };
  const at = only === '.' ? all.filter((study) => !pathOf(study).includes('/')) : [];
  const below = all.filter((study) => isWithin(pathOf(study), only));
  const inFolder = at.length > 0 ? at : below;
  if (inFolder.length > 0) return { studies: inFolder, includes: () => true };
  const includes = (record: string): boolean => record === only || record.startsWith(`${only}.`);
  const withRecord = all.filter(
    (study) => 'problems' in study || [...study.records.nodes.keys()].some(includes),
  );
  if (withRecord.length > 0) return { studies: withRecord, includes };
  throw new Failure(
    'usage',
    `\`--only ${only}\` names no record, no area and no manifest’s folder.`,
    `Manifests here: ${all.map(pathOf).join(', ')}. Records are written as \`inputs.rainfall\`, areas as \`inputs\`.`,
  );
}

export function pathOf(study: Study | Unread): string {
  return 'problems' in study ? study.path : study.manifest.path;
}
