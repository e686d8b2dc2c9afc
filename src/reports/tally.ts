import type { Verdict } from '../verdict/finding.ts';

/** A verdict's counts in a line. */
export function tally({ base, totals }: Verdict): string {
  const { block, warn, note, standing, waived, accepted, cured } = totals;
  return [
    `${count(block, 'finding')} to clear, ${count(warn, 'warning')}, ${count(note, 'note')}`,
    ...(base === null ? [] : [`${standing} standing, ${cured} cured`]),
    ...(waived + accepted === 0 ? [] : [`${waived} waived, ${accepted} accepted`]),
  ].join('; ');
}

/** `1 record`, `12 records`. */
export function count(number: number, noun: string): string {
  return `${number} ${noun}${number === 1 ? '' : 's'}`;
}
