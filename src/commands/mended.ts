import { type FollowedMoves, followMoves } from '../records/follow-moves.ts';
import { type HealedRecord, healSeals, recoverSeals } from '../records/heal.ts';
import type { SealsFile } from '../records/seal.ts';
import { readSealsFile } from '../records/seals-file.ts';
import { judgeStandings } from '../records/standing.ts';
import type { Repository } from '../repository/repository.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { mergedVersions, tornVersions } from './seal-versions.ts';
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
  const versions = isTorn ? await tornVersions(path, repository, snapshot) : null;
  const healed = versions === null ? null : healSeals(versions, study.records);
  const whole = healed === null ? study : withSeals(study, healed);
  const recovered = await recovery(whole, repository, snapshot);
  const seals = new Map(whole.sealsFile.seals);
  for (const { record, seal } of recovered) seals.set(record, seal);
  const complete = recovered.length === 0 ? whole : withSeals(whole, { seals });
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
