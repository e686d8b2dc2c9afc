import { takeVersions, type Versions } from '../records/conflict.ts';
import { type HealedRecord, healSeals } from '../records/heal.ts';
import { judgeStandings } from '../records/standing.ts';
import { conflictSides } from '../repository/conflict-sides.ts';
import type { Repository } from '../repository/repository.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { Study } from './studies.ts';

/** A study whose seals are whole again after a merge, and what was kept of each side; the study itself where there is no conflict. */
export async function healed(
  study: Study,
  repository: Repository,
  snapshot: Snapshot,
): Promise<{ readonly study: Study; readonly records: readonly HealedRecord[] }> {
  if (!study.sealsFile.faults.some(({ kind }) => kind === 'conflict')) return { study, records: [] };
  const versions = await versionsOf(study.sealsFile.path, repository, snapshot);
  if (versions === null) return { study, records: [] };
  const { seals, records } = healSeals(versions, study.records);
  const sealsFile = { ...study.sealsFile, seals, faults: [] };
  return { study: { ...study, sealsFile, standings: judgeStandings(study.records, sealsFile) }, records };
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
