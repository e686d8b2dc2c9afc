import type { Facts } from '../../facts/facts.ts';
import type { FieldPath } from '../../manifest/manifest.ts';
import { nearestName } from '../../manifest/nearest.ts';
import { acceptancesIn } from '../accepted.ts';
import { type Draft, rule } from '../rule.ts';

export const manifestUnknownRecord = rule({
  id: 'manifest.unknown-record',
  scope: 'manifest',
  from: 'setup',
  means: null,
  statement:
    'A name refers to no record (input, run, target), or a departure, waiver or acceptance to no rule or threshold.',
  why: 'What rests on a record that does not exist is never found stale, and a waiver or departure with a misspelt name does nothing.',
  source: { basis: 'definition', citation: 'A reference names something that there is.' },
  clear: 'Correct the name, or write the record that it means. `stoplog rules` lists the rules.',
  check: (_, facts) => [
    ...facts.records.unknown.map(({ record, name, field, nearest }) =>
      unknown(record, field, name, `\`${name}\` is the name of no record`, nearest),
    ),
    ...namedRules(facts).flatMap(([name, field]) =>
      facts.known.rules.has(name)
        ? []
        : unknown(
            'manifest',
            field,
            name,
            `\`${name}\` is no rule`,
            nearestName(name, facts.known.rules.keys()),
          ),
    ),
    ...(facts.manifest.data.departures ?? []).flatMap(({ threshold }, place) =>
      threshold === undefined || facts.known.limits.has(threshold)
        ? []
        : unknown(
            'manifest',
            ['departures', place, 'threshold'],
            threshold,
            `\`${threshold}\` is no threshold`,
            nearestName(threshold, facts.known.limits.keys()),
          ),
    ),
  ],
});

function unknown(record: string, field: FieldPath, name: string, says: string, nearest?: string): Draft {
  return {
    record,
    field,
    subject: name,
    stated: name,
    message: `${says}${nearest === undefined ? '' : `; the nearest is \`${nearest}\``}.`,
  };
}

function namedRules({ manifest: { data } }: Facts): readonly (readonly [string, FieldPath])[] {
  return [
    ...(data.departures ?? []).flatMap(({ rule: named }, place) =>
      named === undefined ? [] : [[named, ['departures', place, 'rule']] as const],
    ),
    ...(data.waivers ?? []).map(({ rule: named }, place) => [named, ['waivers', place, 'rule']] as const),
    ...acceptancesIn(data).map(({ field, acceptance }) => [acceptance.rule, [...field, 'rule']] as const),
  ];
}
