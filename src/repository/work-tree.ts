import { copyFile, stat, utimes } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { type Aside, writingAside } from './aside.ts';
import { ask, type Place, type Question } from './git.ts';
import type { Repository } from './repository.ts';

// The user's post-index-change hook is not ours to run, a split index would be written beside the user's,
// and what is thrown away at once need not be small or safe.
const apart = [
  ...['-c', 'core.hooksPath=/dev/null', '-c', 'core.splitIndex=false', '-c', 'core.safecrlf=false'],
  ...['-c', 'core.compression=0', '-c', 'core.fsync=none'],
];

/** Stores tracked files of the work tree as they are now. */
const addTracked: Question<void> = { args: [...apart, 'add', '--update', '--', '.'], parse: () => {} };

function addPaths(paths: readonly Buffer[]): Question<void> {
  return {
    args: [...apart, 'update-index', '--add', '-z', '--stdin'],
    input: Buffer.concat(paths.flatMap((path) => [path, Buffer.of(0)])),
    parse: () => {},
  };
}

/**
 * Does what `git add` would do with the work tree, filters included, into an index and an object folder of
 * ours, and answers where git sees that index. Nothing of the user's is touched, but a filter of the user's
 * may write: Git LFS keeps the content of an edited file as it would for `git add`. Of the `untracked`
 * files those with one of the `alsoUntracked` names are added.
 */
export async function storeWorkTree(
  repository: Repository,
  aside: Aside,
  untracked: Promise<readonly Buffer[]>,
  alsoUntracked: readonly string[],
): Promise<Place & { readonly objectsFolder: string }> {
  const indexFile = join(aside.folder, 'index');
  await copyIndex(repository.indexFile, indexFile);
  const writing = await writingAside(aside, repository);
  const place = { ...writing, environment: { ...writing.environment, GIT_INDEX_FILE: indexFile } };
  await ask(place, addTracked);
  const added = (await untracked).filter((path) => alsoUntracked.includes(basename(path.toString('latin1'))));
  if (added.length > 0) await ask(place, addPaths(added));
  return place;
}

/**
 * Copies the index with a time that is no later than its own: git trusts sizes and times of files only if
 * they are older than the index, and a copy that looked newer would hide an edit made just after `git add`.
 */
async function copyIndex(from: string, to: string): Promise<void> {
  try {
    const { atimeMs, mtimeMs } = await stat(from);
    await copyFile(from, to);
    await utimes(to, Math.floor(atimeMs / 1000), Math.floor(mtimeMs / 1000));
  } catch (cause) {
    // Before the first `git add` there is no index.
    if ((cause as NodeJS.ErrnoException).code !== 'ENOENT') throw cause;
  }
}
