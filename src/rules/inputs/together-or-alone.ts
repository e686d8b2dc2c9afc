import type { Held } from '../../facts/profiles/beside-others.ts';

/**
 * What is found in single files of an input with several; where it is in none or in all of them, what is found in the files
 * together. One gauge of a mean that is off by 30 takes the mean with it by 10, which says nothing of the others.
 */
export function togetherOrAlone<Result>(
  comparisons: readonly Held[],
  find: (held: Held) => readonly Result[],
): readonly Result[] {
  const together = comparisons.filter(({ file }) => file === null).flatMap(find);
  const each = comparisons.filter(({ file }) => file !== null).map(find);
  const alone = each.filter((found) => found.length > 0);
  const isShared = alone.length === 0 || alone.length === each.length;
  return isShared && together.length > 0 ? together : alone.flat();
}
