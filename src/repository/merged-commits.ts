import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { ask, type Question } from './git.ts';
import { commitOf, type Repository } from './repository.ts';

/** The parents of the commit that is checked out; none before the first commit. */
const parentsOfHead: Question<readonly string[]> = {
  args: ['rev-list', '--parents', '--max-count=1', 'HEAD'],
  statuses: [128],
  parse: (output, status) => (status === 0 ? output.toString('latin1').trim().split(' ').slice(1) : []),
};

/** Revisions that are put together; `ours` as git calls them. */
export interface MergedCommits {
  readonly ours: readonly string[];
  readonly theirs: readonly string[];
}

/**
 * The commits that a merge, a rebase or a cherry-pick is putting together, and those that the commit checked out has put
 * together. None where nothing was merged. A rebase leaves its last commit named when it is done.
 */
export async function mergedCommits(repository: Repository): Promise<MergedCommits> {
  // `MERGE_HEAD` as a revision is the first of several.
  const merging = await readFile(join(repository.gitDirectory, 'MERGE_HEAD'), 'latin1').catch(() => '');
  const picked = await Promise.all(
    ['CHERRY_PICK_HEAD', 'REBASE_HEAD'].map((name) => ask(repository, commitOf(name))),
  );
  const coming = [...merging.split('\n'), ...picked].flatMap((commit) => commit || []);
  const parents = await ask(repository, parentsOfHead);
  return {
    ours: [...(coming.length > 0 ? ['HEAD'] : []), ...parents.slice(0, parents.length > 1 ? 1 : 0)],
    theirs: [...coming, ...parents.slice(1)],
  };
}
