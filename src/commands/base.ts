import { Failure } from '../failure.ts';
import { partingFrom } from '../repository/merge-base.ts';
import { openSnapshot, type SnapshotOptions } from '../repository/open-snapshot.ts';
import type { Repository } from '../repository/repository.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { Against } from './comparison.ts';

/** Opens the state to compare with: that of the commit at which this one left the base. The caller closes it. */
export async function openBase(
  repository: Repository,
  asked: string,
  snapshot: Snapshot,
  opening: SnapshotOptions,
): Promise<Omit<Against, 'asked' | 'strict'>> {
  const parting = await partingFrom(repository, asked, snapshot.commit);
  if ('unavailable' in parting) return { base: null, crossed: false, unavailable: parting.unavailable };
  try {
    const { commit, crossed } = parting;
    const base = await openSnapshot(repository, { kind: 'revision', revision: commit }, opening);
    return { base, crossed, unavailable: null };
  } catch (error) {
    if (!(error instanceof Failure)) throw error;
    const whole = 'A clone that lacks older content needs it fetched: git fetch --refetch --no-filter.';
    return {
      base: null,
      crossed: false,
      unavailable: `The base could not be read: ${error.message} ${whole}`,
    };
  }
}
