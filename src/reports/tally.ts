import type { ManifestVerdict, Verdict } from '../verdict/finding.ts';

/** A verdict's counts in a line. */
export function tally({ base, totals }: Verdict): string {
  const { block, warn, note, standing, waived, accepted, cured } = totals;
  return [
    `${count(block, 'finding')} to clear, ${count(warn, 'warning')}, ${count(note, 'note')}`,
    ...(base === null ? [] : [`${standing} standing, ${cured} cured`]),
    ...(waived + accepted === 0 ? [] : [`${waived} waived, ${accepted} accepted`]),
  ].join('; ');
}

/** Stands in place of phase and records where a manifest could not be read. */
export const unread = 'the manifest could not be read, so no record was checked';

/** `12 of 14 records sound` */
export function soundOf({ records }: ManifestVerdict): string {
  return `${records.filter(({ state }) => state === 'sound').length} of ${count(records.length, 'record')} sound`;
}

/** `1 record`, `12 records`. */
export function count(number: number, noun: string): string {
  return `${number} ${noun}${number === 1 ? '' : 's'}`;
}
