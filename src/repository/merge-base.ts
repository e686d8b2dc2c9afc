import { Failure } from '../failure.ts';
import { ask, type Question } from './git.ts';
import type { Repository } from './repository.ts';

/** The commit at which two histories parted, or why none was found and what to do; whole sentences. */
export type Parting = { readonly commit: string } | { readonly unavailable: string };

/** The newest commit that both have, the first of them where a criss-cross of merges has several; null where they share none. */
export function mergeBase(one: string, other: string): Question<string | null> {
  return {
    args: ['merge-base', one, other],
    statuses: [1],
    parse: (output, status) => (status === 0 ? output.toString('latin1').trim() : null),
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
  const found = await ask(repository, mergeBase(named, commit));
  if (found !== null) return { commit: found };
  return {
    unavailable: repository.shallow
      ? `Where this left ${base} lies beyond the newest commits, and only those were fetched. Fetch the rest (git fetch --unshallow; in CI, fetch depth 0) and try again.`
      : `This shares no commit with ${base}, so there is no common past to compare with. Name another base, or rebase onto it.`,
  };
}
