import type { Facts, KnownRules } from '../../facts/facts.ts';
import type { ManifestData, Waiver } from '../../manifest/data.generated.ts';
import { type FieldPath, fieldName } from '../../manifest/manifest.ts';
import { acceptancesIn } from '../accepted.ts';
import { type Draft, phases, rule } from '../rule.ts';

export const manifestLoosened = rule({
  id: 'manifest.loosened',
  scope: 'manifest',
  from: 'warn',
  means: null,
  statement:
    'The change lowers the phase, loosens a level or threshold, or adds or prolongs a waiver or an acceptance.',
  why: 'A change that asks for less can let its own faults pass. Whoever reviews it should look at this first.',
  source: { basis: 'house', citation: 'Our own choice: a lowered bar is shown before all else.' },
  clear: 'Nothing to mend if it is meant; a reviewer should agree with the reason.',
  check(_, facts) {
    if (facts.before === null) return [];
    const [old, now] = [facts.before.data, facts.manifest.data];
    return [...phase(old, now), ...levels(old, now, facts), ...waivers(old, now), ...acceptances(old, now)];
  },
});

function loosened(subject: string, field: FieldPath, message: string): Draft {
  return { record: 'manifest', field, subject, message };
}

function phase(old: ManifestData, now: ManifestData): readonly Draft[] {
  const [was, is] = [old.study?.phase ?? 'setup', now.study?.phase ?? 'setup'];
  if (phases.indexOf(is) >= phases.indexOf(was)) return [];
  return [
    loosened(
      'phase',
      ['study', 'phase'],
      `This change takes the study back from phase \`${was}\` to \`${is}\`.`,
    ),
  ];
}

function levels(old: ManifestData, now: ManifestData, { known }: Facts): readonly Draft[] {
  const names = [...(old.departures ?? []), ...(now.departures ?? [])].flatMap(
    ({ rule: named, threshold }) => named ?? threshold ?? [],
  );
  return [...new Set(names)].flatMap((name) => {
    const [was, is] = [inForce(name, old, known), inForce(name, now, known)];
    if (was === null || is === null || is.strictness >= was.strictness) return [];
    const place = (now.departures ?? []).findIndex((one) => (one.rule ?? one.threshold) === name);
    const field = place < 0 ? ['departures'] : ['departures', place];
    return loosened(name, field, `This change makes ${name} less strict: ${was.said}, now ${is.said}.`);
  });
}

/** What a rule or threshold asks for by a manifest: the last departure from it, else Stoplog's default; null for an unknown one. */
function inForce(
  name: string,
  data: ManifestData,
  known: KnownRules,
): { strictness: number; said: string } | null {
  const departed = (data.departures ?? []).findLast((one) => (one.rule ?? one.threshold) === name)?.now;
  const limit = known.limits.get(name);
  if (limit !== undefined) {
    const value = typeof departed === 'number' ? departed : limit.default;
    return { strictness: limit.looser === 'higher' ? -value : value, said: String(value) };
  }
  const from = known.rules.get(name);
  if (from === undefined) return null;
  const ladder = ['notes', 'warns', from === 'warn' ? '' : `blocks from ${from}`, 'blocks'];
  const said = typeof departed === 'string' ? departed : from === 'warn' ? 'warns' : `blocks from ${from}`;
  return { strictness: ladder.indexOf(said), said };
}

function waivers(old: ManifestData, now: ManifestData): readonly Draft[] {
  const key = ({ rule: waived, record = '', subject = '' }: Waiver) =>
    `${waived} ${record} ${subject}`.trim();
  const was = new Map((old.waivers ?? []).map((one) => [key(one), one.until ?? '']));
  return (now.waivers ?? []).flatMap((waiver, place) => {
    const until = was.get(key(waiver));
    if (until !== undefined && until >= (waiver.until ?? '')) return [];
    const says =
      until === undefined
        ? `This change adds a waiver of ${key(waiver)}, until ${waiver.until ?? 'no stated day'}.`
        : `This change prolongs the waiver of ${key(waiver)} from ${until} to ${waiver.until}.`;
    return loosened(key(waiver), ['waivers', place], says);
  });
}

function acceptances(old: ManifestData, now: ManifestData): readonly Draft[] {
  const keyed = (data: ManifestData) =>
    acceptancesIn(data).map(({ field, acceptance }) => {
      const place = fieldName(field.slice(0, -2).filter((part) => typeof part === 'string'));
      return { key: `${acceptance.rule} ${acceptance.driver ?? ''} ${place}`, place, field, acceptance };
    });
  const was = new Set(keyed(old).map(({ key }) => key));
  return keyed(now)
    .filter(({ key }) => !was.has(key))
    .map(({ key, place, field, acceptance }) =>
      loosened(key, field, `This change accepts ${acceptance.rule} for ${place}.`),
    );
}
