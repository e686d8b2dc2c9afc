import { Failure } from '../failure.ts';
import { ask, type Question } from './git.ts';
import type { Repository } from './repository.ts';

/** The commit at which two histories parted, or why none was found and what to do; whole sentences. */
export type Parting =
  | {
      readonly commit: string;
      /** Whether it is one of several, since the histories were merged crosswise. */
      readonly crossed: boolean;
    }
  | { readonly unavailable: string };

/** The newest commits that both have: one, several after a criss-cross of merges, or none. */
export function mergeBases(one: string, other: string): Question<readonly string[]> {
  return {
    args: ['merge-base', '--all', one, other],
    statuses: [1],
    parse: (output) => output.toString('latin1').split('\n').slice(0, -1),
  };
}

/**
 * Where a commit left the base that it is to be compared with, as a pull request is judged: what the base gained since is
 * neither praised nor blamed. `commit` is null before the first commit.
 */
export async function partingFrom(
  repository: Repository,
  base: string,
  commit: string | null,
): Promise<Parting> {
  const named = await repository.resolve(base).catch((error: unknown) => {
    if (error instanceof Failure && error.code === 'unknown-revision') return error;
    throw error;
  });
  if (named instanceof Failure) return { unavailable: `${named.message} ${named.next}` };
  if (commit === null) return { unavailable: 'There is no commit here yet that could have left the base.' };
  const [first, ...more] = await ask(repository, mergeBases(named, commit));
  if (first !== undefined) return { commit: first, crossed: more.length > 0 };
  return {
    unavailable: repository.shallow
      ? `Where this left ${base} lies beyond the newest commits, and only those were fetched. Fetch the rest (git fetch --unshallow; in CI, fetch depth 0) and try again.`
      : `This shares no commit with ${base}, so there is no common past to compare with. Name another base, or rebase onto it.`,
  };
}
