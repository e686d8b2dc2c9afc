import type { Verdict } from '../verdict/finding.ts';
import { count } from './text.ts';

/** The verdict and its counts in a line. */
export function tally({ verdict, totals }: Verdict): string {
  const { block, warn, note, standing, waived, accepted, cured } = totals;
  const more: readonly (readonly [number, string])[] = [
    [standing, 'standing from before'],
    [waived, 'waived'],
    [accepted, 'accepted'],
    [cured, 'cured by this change'],
  ];
  return [
    `${verdict}: ${count(block, 'finding')} to clear`,
    count(warn, 'warning'),
    count(note, 'note'),
    ...more.filter(([number]) => number > 0).map(([number, what]) => `${number} ${what}`),
  ].join(', ');
}
