import type { KnownRules } from '../facts/facts.ts';

/** The words by which a departure sets a rule's level, and the level of each. */
export const departedLevels = { blocks: 'block', warns: 'warn', notes: 'note' } as const;
export type DepartedLevel = keyof typeof departedLevels;

export interface Departure {
  readonly rule?: string;
  readonly threshold?: string;
  readonly now?: string | number;
  readonly because?: string;
}

/** Whether a departure asks for less than Stoplog's default does; false for one that names nothing known. */
export function loosens(departure: Departure, known: KnownRules): boolean {
  const { rule, threshold, now } = departure;
  if (rule !== undefined && typeof now === 'string') {
    const from = known.rules.get(rule);
    return from !== undefined && (now === 'notes' || (now === 'warns' && from !== 'warn'));
  }
  const limit = threshold === undefined ? undefined : known.limits.get(threshold);
  if (limit === undefined || typeof now !== 'number') return false;
  return limit.looser === 'higher' ? now > limit.default : now < limit.default;
}
