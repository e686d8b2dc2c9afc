import { posix } from 'node:path';
import { takeVersions, type Versions } from '../records/conflict.ts';
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

const nothingMoved: FollowedMoves = { seals: new Map(), files: [], records: [], ambiguous: [] };

/** A study whose seals are whole again after a merge and, where asked for, follow what was renamed. */
export async function mended(
  study: Study,
  followRenames: boolean,
  repository: Repository,
  snapshot: Snapshot,
): Promise<Mended> {
  const { path, faults } = study.sealsFile;
  const versions = faults.some(({ kind }) => kind === 'conflict')
    ? await versionsOf(path, repository, snapshot)
    : null;
  const healed = versions === null ? null : healSeals(versions, study.records);
  const whole = healed === null ? study : withSeals(study, healed);
  const recovered = await recovery(whole, repository, snapshot);
  const complete =
    recovered.length === 0
      ? whole
      : withSeals(whole, {
          seals: new Map([
            ...whole.sealsFile.seals,
            ...recovered.map(({ record, seal }) => [record, seal] as const),
          ]),
        });
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

/** From the index, where git keeps whole versions; else from the markers in the text. */
async function versionsOf(
  path: string,
  repository: Repository,
  snapshot: Snapshot,
): Promise<Versions | null> {
  const sides = await conflictSides(repository, path, snapshot);
  const ours = textOf(sides?.ours ?? null);
  const theirs = textOf(sides?.theirs ?? null);
  if (ours !== null && theirs !== null) return { base: textOf(sides?.base ?? null), ours, theirs };
  return takeVersions(textOf(await snapshot.read(path)) ?? '');
}

/** Where a conflict was settled by taking one side of the file, the seals of the other are still in its commit. */
async function recovery(
  { sealsFile, standings, records }: Study,
  repository: Repository,
  snapshot: Snapshot,
): Promise<readonly HealedRecord[]> {
  if ([...standings.values()].every(({ state }) => state === 'sealed')) return [];
  const sides: ['ours' | 'theirs', SealsFile][] = [];
  const merged = await mergedCommits(repository);
  for (const side of ['ours', 'theirs'] as const)
    for (const commit of merged[side]) {
      // A clone may lack the trees of older commits.
      const files = (await ask(repository, { ...treeEntries(commit), statuses: [128] })).filter(
        ({ path }) => posix.basename(path) === sealsName,
      );
      // Where a side has none at the path, its folder had another name there.
      const same = files.filter(({ path }) => path === sealsFile.path);
      for (const { path, blob } of same.length > 0 ? same : files)
        sides.push([side, readSealsFile(path, textOf(await snapshot.readBlob(blob)))]);
    }
  return recoverSeals(sides, sealsFile, records);
}

function textOf(bytes: Uint8Array | null): string | null {
  return bytes === null ? null : new TextDecoder().decode(bytes);
}
