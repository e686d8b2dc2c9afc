import { posix } from 'node:path';
import { conflictLine, takeVersions, type Versions } from '../records/conflict.ts';
import { readSealsFile } from '../records/seals-file.ts';
import { sealsName } from '../records/seals-path.ts';
import { conflictSides } from '../repository/conflict-sides.ts';
import { ask } from '../repository/git.ts';
import { treeEntries } from '../repository/listing.ts';
import { mergedCommits } from '../repository/merged-commits.ts';
import type { Repository } from '../repository/repository.ts';
import type { Snapshot } from '../repository/snapshot.ts';

/**
 * The versions of a torn seals file: from the index, where git keeps whole ones; else from the markers in the text; else, where
 * these were torn, from the commits that were merged. Null where there is nothing to put together.
 */
export async function tornVersions(
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
  const firstOf = (side: MergedVersion['side']) => merged.find((one) => one.side === side)?.text ?? null;
  const [ours, theirs] = [firstOf('ours'), firstOf('theirs')];
  return isWhole(ours) && isWhole(theirs) ? { base: null, ours, theirs } : marked;
}

interface MergedVersion {
  readonly side: 'ours' | 'theirs';
  /** Null where its content is not here. */
  readonly text: string | null;
}

/** The seals files of the commits that are put together. Where one has none at the path, its folder had another name there. */
export async function mergedVersions(
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

function isWhole(text: string | null): text is string {
  return text !== null && readSealsFile('', text).faults.every(({ record }) => record !== null);
}

function textOf(bytes: Uint8Array | null): string | null {
  return bytes === null ? null : new TextDecoder().decode(bytes);
}
