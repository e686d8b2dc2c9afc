import type { Facts } from '../facts/facts.ts';
import type { Draft, Rule } from '../rules/rule.ts';
import { isStated } from '../rules/stand-in.ts';
import { isMeantFor } from '../rules/waived.ts';

/** Faults that leave nothing to judge by; no waiver reaches them, and they never stand. */
export const neverWaived: ReadonlySet<string> = new Set(['manifest.unreadable', 'seal.unreadable']);

/** The waiver that lets a finding pass, as `reason (person, until date)`; null when none in force names it. */
export function waiverFor(rule: Rule, draft: Draft, facts: Facts): string | null {
  if (neverWaived.has(rule.id)) return null;
  const waiver = (facts.manifest.data.waivers ?? []).find(
    (one) =>
      isMeantFor(one, { ...draft, rule: rule.id }) &&
      isStated(one.because) &&
      isStated(one.by) &&
      one.until !== undefined &&
      one.until >= facts.today,
  );
  return waiver ? `${waiver.because} (${waiver.by}, until ${waiver.until})` : null;
}

/** The acceptance in the finding's own record that answers for it, as `reason (person, date)`; null when none holds. */
export function acceptanceFor(rule: Rule, draft: Draft, facts: Facts): string | null {
  if (!rule.acceptable) return null;
  const accepts = acceptancesOf(facts.record(draft.record)?.fragment);
  const fallen = facts.standings.get(draft.record)?.fallen ?? [];
  const acceptance = accepts.find(
    (one, place) =>
      one.rule === rule.id &&
      (one.driver === undefined || one.driver === draft.subject) &&
      isStated(one.because) &&
      isStated(one.by) &&
      one.on !== undefined &&
      !fallen.includes(place),
  );
  return acceptance ? `${acceptance.because} (${acceptance.by}, ${acceptance.on})` : null;
}

interface Acceptance {
  readonly rule?: string;
  readonly driver?: string;
  readonly because?: string;
  readonly by?: string;
  readonly on?: string;
}

function acceptancesOf(fragment: unknown): readonly Acceptance[] {
  const { accepts } = (fragment ?? {}) as { accepts?: readonly Acceptance[] };
  return accepts ?? [];
}
