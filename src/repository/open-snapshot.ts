import { Failure } from '../failure.ts';
import { type Aside, objectsOnly, openAside } from './aside.ts';
import { fileBeside } from './beside.ts';
import { contentOf } from './content.ts';
import { ask, type Place } from './git.ts';
import { gitBlobs } from './git-blobs.ts';
import { largeFilesIn } from './large-files.ts';
import { byPath, type Listing, listCommit, listIndex, treeEntries, untrackedFiles } from './listing.ts';
import { type Memories, openMemories } from './memories.ts';
import { nameFromBytes } from './names.ts';
import { onDisk } from './on-disk.ts';
import { commitOf, type Repository } from './repository.ts';
import type { At, Snapshot } from './snapshot.ts';
import { storeWorkTree } from './work-tree.ts';

export interface SnapshotOptions {
  /** Names (without folder) of files that belong to a work-tree snapshot even before their first `git add`; ignored ones do not. */
  readonly alsoUntracked?: readonly string[];
  /** What the run knows already, where it opens several states; else opened for this one. */
  readonly memories?: Memories | undefined;
  /** Without `memories`: false to hash and compute everything anew and keep nothing under the git directory. */
  readonly remember?: boolean;
  /** Told how far long work has come. */
  readonly progress?: ((text: string) => void) | undefined;
}

/** What a state holds, and where its objects are. */
interface State extends Pick<Snapshot, 'label' | 'commit' | 'untracked'> {
  readonly listing: Listing;
  readonly objects: Place & { readonly objectsFolder: string };
}

/**
 * Opens one state of a repository; the caller closes it. Nothing is written into the repository but the
 * disposable memories of digests and of what was computed.
 * Failures: 'usage' (work tree or index of a bare repository), 'unknown-revision', 'unreadable-file', 'git-failed'.
 */
export async function openSnapshot(
  repository: Repository,
  at: At,
  options: SnapshotOptions = {},
): Promise<Snapshot> {
  const aside = await openAside();
  try {
    const { listing, objects, ...state } = await stateOf(repository, at, aside, options.alsoUntracked ?? []);
    const { objectFormat, commonDirectory } = repository;
    const blobs = gitBlobs(await objectsOnly(aside, { ...objects, objectFormat }), objectFormat);
    const { progress } = options;
    const memories = options.memories ?? (await openMemories(repository, options));
    const { digests, values } = memories;
    const contentIn = (listed: Listing) =>
      contentOf(listed, blobs, largeFilesIn(commonDirectory), memories, progress);
    return Object.freeze({
      at,
      ...state,
      ...listing,
      ...contentIn(listing),
      async readBefore(path: string) {
        const { commit } = state;
        const before = at.kind === 'revision' ? await ask(repository, commitOf(`${commit}^1`)) : commit;
        if (before === null) return null;
        // A clone may lack the trees of older commits; then nothing is known of before.
        const found = await ask(repository, { ...treeEntries(before, [path]), statuses: [128] });
        return contentIn({ entries: byPath(found), unmerged: [], intentToAdd: [] }).read(path);
      },
      fileBeside: async (path: string) =>
        repository.top === null ? null : fileBeside(repository.top, path, values.remember),
      onDisk: async (pattern: string) =>
        repository.top === null || at.kind === 'revision' ? [] : onDisk(repository.top, pattern),
      remember: values.remember,
      async close() {
        await blobs.close();
        await Promise.all([digests.save(), values.save(), aside.remove()]);
      },
    });
  } catch (cause) {
    await aside.remove();
    throw cause;
  }
}

async function stateOf(
  repository: Repository,
  at: At,
  aside: Aside,
  alsoUntracked: readonly string[],
): Promise<State> {
  if (at.kind === 'revision') {
    const commit = await repository.resolve(at.revision);
    const listing = await listCommit(repository, commit);
    return { label: commit.slice(0, 7), commit, listing, untracked: [], objects: repository };
  }
  if (repository.top === null) {
    throw new Failure(
      'usage',
      `There is no work tree at ${repository.gitDirectory}, so nothing is staged or edited there.`,
      'Name a revision, such as --at HEAD.',
    );
  }
  const onDisk = ask(repository, untrackedFiles);
  const stored =
    at.kind === 'index'
      ? Promise.resolve(repository)
      : storeWorkTree(repository, aside, onDisk, alsoUntracked);
  const [objects, listing, commit, untracked] = await Promise.all([
    stored,
    stored.then((place) => listIndex(place, repository.objectFormat)),
    ask(repository, commitOf('HEAD')),
    onDisk.then((names) => names.map(nameFromBytes)),
  ]);
  return {
    label: at.kind === 'index' ? 'staged for commit' : 'work tree',
    commit,
    listing,
    untracked: untracked.filter((path) => !listing.entries.has(path)),
    objects,
  };
}
