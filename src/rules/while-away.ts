import type { Away } from '../facts/input.ts';
import type { Draft } from './rule.ts';

/** How content that is not here is brought here. */
export const bringHere: Readonly<Record<Away, string>> = {
  'not-in-git':
    'Correct the path, or add the file to git (with Git LFS if it is large): from a file that git does not hold nothing can be recomputed.',
  link: 'Put the file itself at its path in place of the link.',
  'not-fetched': 'Fetch the content (git lfs pull, or a full clone) and check again.',
};

/** The level and next step of what can't be recomputed because content is not here. */
export function whileAway(away: Away): Pick<Draft, 'from' | 'before' | 'clear'> {
  return { from: 'archive', before: 'warn', clear: bringHere[away] };
}
