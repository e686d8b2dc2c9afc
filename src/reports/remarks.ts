import type { Verdict } from '../verdict/finding.ts';

/** Why nothing was compared with the base, or what to know of the comparison; nothing where none was asked for. */
export function remarks({ comparison }: Verdict): readonly string[] {
  if (comparison === null) return [];
  const { asked, unavailable, notes } = comparison;
  if (unavailable === null) return notes;
  return [
    `Not compared with ${asked}: ${unavailable} All of this content was checked instead, and everything found counts as new.`,
  ];
}
