import { takeVersions, type Versions } from '../records/conflict.ts';
import { type FollowedMoves, followMoves } from '../records/follow-moves.ts';
import { type HealedRecord, healSeals } from '../records/heal.ts';
import type { Seal } from '../records/seal.ts';
import { judgeStandings } from '../records/standing.ts';
import { conflictSides } from '../repository/conflict-sides.ts';
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
  const versions = study.sealsFile.faults.some(({ kind }) => kind === 'conflict')
    ? await versionsOf(study.sealsFile.path, repository, snapshot)
    : null;
  const healed = versions === null ? null : healSeals(versions, study.records);
  const whole = healed === null ? study : withSeals(study, healed.seals);
  const moved = followRenames ? followMoves(whole.records, whole.sealsFile) : nothingMoved;
  return {
    study: followRenames ? withSeals(whole, moved.seals) : whole,
    healed: healed?.records ?? [],
    moved,
  };
}

function withSeals(study: Study, seals: ReadonlyMap<string, Seal>): Study {
  const faults = study.sealsFile.faults.filter(({ kind }) => kind !== 'conflict');
  const sealsFile = { ...study.sealsFile, seals, faults };
  return { ...study, sealsFile, standings: judgeStandings(study.records, sealsFile) };
}

/** From the index, where git keeps whole versions; else from the markers in the text. */
async function versionsOf(
  path: string,
  repository: Repository,
  snapshot: Snapshot,
): Promise<Versions | null> {
  const text = (bytes: Uint8Array | null): string | null =>
    bytes === null ? null : new TextDecoder().decode(bytes);
  const sides = await conflictSides(repository, path, snapshot);
  const ours = text(sides?.ours ?? null);
  const theirs = text(sides?.theirs ?? null);
  if (ours !== null && theirs !== null) return { base: text(sides?.base ?? null), ours, theirs };
  return takeVersions(text(await snapshot.read(path)) ?? '');
}
