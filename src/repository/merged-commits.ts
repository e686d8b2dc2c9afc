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

/**
 * The commits that are being put together (by a merge, a rebase or a cherry-pick that is not finished), else those that the
 * commit checked out has put together; first the side that git calls "ours". None where nothing was merged.
 */
export async function mergedCommits(repository: Repository): Promise<readonly string[]> {
  // `MERGE_HEAD` as a revision is the first of several.
  const merging = await readFile(join(repository.gitDirectory, 'MERGE_HEAD'), 'latin1').catch(() => '');
  const picked = await Promise.all(
    ['CHERRY_PICK_HEAD', 'REBASE_HEAD'].map((name) => ask(repository, commitOf(name))),
  );
  const others = [...merging.split('\n'), ...picked].flatMap((commit) => commit || []);
  if (others.length > 0) return ['HEAD', ...others];
  const parents = await ask(repository, parentsOfHead);
  return parents.length > 1 ? parents : [];
}
