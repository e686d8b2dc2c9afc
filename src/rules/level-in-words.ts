import type { Rule } from './rule.ts';

/** How strict a rule is by default, for people. */
export function levelInWords({ from, before = 'note', acceptable }: Rule): string {
  if (from === 'warn') return 'warns';
  const earlier = from === 'setup' ? '' : `, ${before === 'warn' ? 'warns' : 'is a note'} before`;
  return `blocks from ${from}${earlier}${acceptable ? ', unless accepted in its record' : ''}`;
}
