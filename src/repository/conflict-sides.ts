import { ask, type Place } from './git.ts';
import { stagedEntries } from './listing.ts';
import type { Snapshot } from './snapshot.ts';

/** The three versions that git keeps of a file in conflict; null for a side that has none. */
export interface ConflictSides {
  readonly base: Uint8Array | null;
  readonly ours: Uint8Array | null;
  readonly theirs: Uint8Array | null;
}

/** The sides of a path that is in conflict in the index (stages 1, 2 and 3); null for a path that is not. */
export async function conflictSides(
  place: Place,
  path: string,
  snapshot: Pick<Snapshot, 'readBlob'>,
): Promise<ConflictSides | null> {
  const staged = await ask(place, {
    ...stagedEntries,
    args: [...stagedEntries.args, '--full-name', '--', path],
  });
  const side = async (stage: string): Promise<Uint8Array | null> => {
    const blob = staged.find((entry) => entry.stage === stage)?.blob;
    return blob === undefined ? null : snapshot.readBlob(blob);
  };
  if (!staged.some((entry) => entry.stage !== '0')) return null;
  return { base: await side('1'), ours: await side('2'), theirs: await side('3') };
}
