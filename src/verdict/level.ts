import { type DepartedLevel, departedLevels } from '../rules/departure.ts';
import type { Draft, Phase, Rule } from '../rules/rule.ts';
import { phases } from '../rules/rule.ts';
import type { Level } from './finding.ts';

/** What a finding counts as in a phase: the departure's level if there is one, else by the rule's own table. */
export function levelOf(rule: Rule, draft: Draft, phase: Phase, departed: DepartedLevel | undefined): Level {
  if (departed !== undefined) return departedLevels[departed];
  const from = draft.from ?? rule.from;
  if (from === 'warn') return 'warn';
  if (phases.indexOf(phase) >= phases.indexOf(from)) return 'block';
  return draft.before ?? rule.before ?? 'note';
}
