import { posix } from 'node:path';
import { conflictLine, takeVersions, type Versions } from '../records/conflict.ts';
import { type FollowedMoves, followMoves } from '../records/follow-moves.ts';
import { type HealedRecord, healSeals, recoverSeals } from '../records/heal.ts';
import type { SealsFile } from '../records/seal.ts';
import { readSealsFile } from '../records/seals-file.ts';
import { sealsName } from '../records/seals-path.ts';
import { judgeStandings } from '../records/standing.ts';
import { conflictSides } from '../repository/conflict-sides.ts';
import { ask } from '../repository/git.ts';
import { treeEntries } from '../repository/listing.ts';
import { mergedCommits } from '../repository/merged-commits.ts';
import type { Repository } from '../repository/repository.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { Study } from './studies.ts';

/** What was done to the seals before anything is sealed anew. */
export interface Mended {
  readonly study: Study;
  readonly healed: readonly HealedRecord[];
  readonly moved: FollowedMoves;
}

export const nothingMoved: FollowedMoves = { seals: new Map(), files: [], records: [], ambiguous: [] };

/** A study whose seals are whole again after a merge and, where asked for, follow what was renamed. */
export async function mended(
  study: Study,
  followRenames: boolean,
  repository: Repository,
  snapshot: Snapshot,
): Promise<Mended> {
  const { path, faults } = study.sealsFile;
  const isTorn = faults.some(({ kind }) => kind === 'conflict' || kind === 'not-json');
  const versions = isTorn ? await versionsOf(path, repository, snapshot) : null;
  const healed = versions === null ? null : healSeals(versions, study.records);
  const whole = healed === null ? study : withSeals(study, healed);
  const recovered = await recovery(whole, repository, snapshot);
  const found = recovered.map(({ record, seal }) => [record, seal] as const);
  const complete =
    found.length === 0 ? whole : withSeals(whole, { seals: new Map([...whole.sealsFile.seals, ...found]) });
  const moved = followRenames ? followMoves(complete.records, complete.sealsFile) : nothingMoved;
  return {
    study: followRenames ? withSeals(complete, moved) : complete,
    healed: [...(healed?.records ?? []), ...recovered],
    moved,
  };
}

function withSeals(study: Study, changed: Pick<SealsFile, 'seals'> & Partial<SealsFile>): Study {
  const { seals, unreadable, faults } = { ...study.sealsFile, ...changed };
  const sealsFile = { ...study.sealsFile, seals, unreadable, faults };
  return { ...study, sealsFile, standings: judgeStandings(study.records, sealsFile) };
}

/**
 * From the index, where git keeps whole versions; else from the markers in the text; else, where these were torn, from the commits
 * that were merged. Null where there is nothing to put together.
 */
async function versionsOf(
  path: string,
  repository: Repository,
  snapshot: Snapshot,
): Promise<Versions | null> {
  const sides = await conflictSides(repository, path, snapshot);
  const staged = { ours: textOf(sides?.ours ?? null), theirs: textOf(sides?.theirs ?? null) };
  if (staged.ours !== null && staged.theirs !== null) return { ...staged, base: textOf(sides?.base ?? null) };
  const text = textOf(await snapshot.read(path)) ?? '';
  const marked = conflictLine(text) === null ? null : takeVersions(text);
  if (marked !== null && isWhole(marked.ours) && isWhole(marked.theirs)) return marked;
  const merged = await mergedVersions(path, repository, snapshot);
  const [ours, theirs] = ['ours', 'theirs'].map(
    (side) => merged.find((one) => one.side === side)?.text ?? null,
  );
  return isWhole(ours) && isWhole(theirs) ? { base: null, ours, theirs } : marked;
}

function isWhole(text: string | null | undefined): text is string {
  return typeof text === 'string' && readSealsFile('', text).faults.every(({ record }) => record !== null);
}

/** Where a conflict was settled by taking one side of the file, the seals of the other are still in its commit. */
async function recovery(
  { sealsFile, standings, records }: Study,
  repository: Repository,
  snapshot: Snapshot,
): Promise<readonly HealedRecord[]> {
  if ([...standings.values()].every(({ state }) => state === 'sealed')) return [];
  const merged = await mergedVersions(sealsFile.path, repository, snapshot);
  return recoverSeals(
    merged.map(({ side, text }) => [side, readSealsFile(sealsFile.path, text)]),
    sealsFile,
    records,
  );
}

interface MergedVersion {
  readonly side: 'ours' | 'theirs';
  readonly text: string | null;
}

/** The seals files of the commits that are put together. Where one has none at the path, its folder had another name there. */
async function mergedVersions(
  path: string,
  repository: Repository,
  snapshot: Snapshot,
): Promise<readonly MergedVersion[]> {
  const merged = await mergedCommits(repository);
  const versions: MergedVersion[] = [];
  for (const side of ['ours', 'theirs'] as const)
    for (const commit of merged[side]) {
      // A clone may lack the trees of older commits.
      const entries = await ask(repository, { ...treeEntries(commit), statuses: [128] });
      const files = entries.filter((entry) => posix.basename(entry.path) === sealsName);
      const same = files.filter((entry) => entry.path === path);
      for (const { blob } of same.length > 0 ? same : files)
        versions.push({ side, text: textOf(await snapshot.readBlob(blob)) });
    }
  return versions;
}

function textOf(bytes: Uint8Array | null): string | null {
  return bytes === null ? null : new TextDecoder().decode(bytes);
}
