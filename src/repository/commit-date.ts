import { Failure } from '../failure.ts';
import type { Question } from './git.ts';

/** The committer's date of a commit (its full id) in UTC, such as `2025-03-12T09:00:00Z`. */
export function commitDate(commit: string): Question<string> {
  return {
    args: ['cat-file', 'commit', commit],
    parse(output) {
      const seconds = /^committer .* (\d{1,11}) [+-]\d{4}$/m.exec(output.toString('latin1'))?.[1];
      if (seconds !== undefined) return `${new Date(Number(seconds) * 1000).toISOString().slice(0, -5)}Z`;
      throw new Failure(
        'git-failed',
        `The commit ${commit} has no date of its committer that can be read.`,
        'See `git fsck`; make the commit anew.',
      );
    },
  };
}
