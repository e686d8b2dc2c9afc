import type { Held } from '../../facts/profiles/beside-others.ts';

/** What is found in the files together; where that is nothing, what is found in each of them alone. */
export function togetherOrAlone<Result>(
  comparisons: readonly Held[],
  find: (held: Held) => readonly Result[],
): readonly Result[] {
  const together = comparisons.filter(({ file }) => file === null).flatMap(find);
  return together.length > 0 ? together : comparisons.filter(({ file }) => file !== null).flatMap(find);
}
