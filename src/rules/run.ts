import type { Facts, Found } from '../facts/facts.ts';
import type { Area, FragmentOf, RecordNode } from '../records/record.ts';
import { namedAreas } from '../records/record.ts';
import type { Draft, Limits, Rule, Scope, UnreadManifest } from './rule.ts';

/** A draft with the rule that wrote it. */
export interface Raised {
  readonly rule: Rule;
  readonly draft: Draft;
}

/** Runs the rules over one readable manifest: first those that look at records, then those that look at what was found. */
export function runRules(rules: readonly Rule[], facts: Facts): readonly Raised[] {
  const thresholds = thresholdsOf(facts);
  const run = (chosen: readonly Rule[], given: Facts) =>
    chosen.flatMap((rule) =>
      subjectsOf(rule.scope, given).flatMap((subject) =>
        rule
          .check(subject as never, given as never, limitsOf(rule, thresholds))
          .map((draft) => ({ rule, draft })),
      ),
    );
  const readable = rules.filter((rule) => rule.scope !== 'file');
  const first = run(
    readable.filter((rule) => !rule.second),
    facts,
  );
  const found = first.map(
    ({ rule, draft: { record, subject } }): Found => ({
      rule: rule.id,
      record,
      ...(subject === undefined ? {} : { subject }),
    }),
  );
  return [
    ...first,
    ...run(
      readable.filter((rule) => rule.second),
      { ...facts, found },
    ),
  ];
}

/** Runs the rules about a manifest that can't be read. */
export function runFileRules(rules: readonly Rule[], unread: UnreadManifest): readonly Raised[] {
  return rules
    .filter((rule) => rule.scope === 'file')
    .flatMap((rule) => rule.check(unread as never, null as never, {}).map((draft) => ({ rule, draft })));
}

/** A rule's limits: its defaults, and where the project departs from them, the project's. */
export function limitsOf(rule: Rule, thresholds: ReadonlyMap<string, number>): Limits {
  return Object.fromEntries(
    Object.entries(rule.limits ?? {}).map(([name, limit]) => [
      name,
      thresholds.get(thresholdName(rule, name)) ?? limit.default,
    ]),
  );
}

/** `balance.residual_share`: how a departure names a limit. */
export function thresholdName(rule: Rule, limit: string): string {
  return `${rule.id.slice(0, rule.id.indexOf('.'))}.${limit}`;
}

function thresholdsOf(facts: Facts): ReadonlyMap<string, number> {
  return new Map(
    (facts.manifest.data.departures ?? []).flatMap((departure) =>
      departure.threshold !== undefined && typeof departure.now === 'number'
        ? [[departure.threshold, departure.now] as const]
        : [],
    ),
  );
}

function subjectsOf(scope: Scope, facts: Facts): readonly (RecordNode | null)[] {
  if (scope === 'manifest' || scope === 'file') return [null];
  const present = [...facts.records.nodes.values()].filter((record) => record.area === scope);
  if (present.length > 0 || (namedAreas as readonly string[]).includes(scope)) return present;
  return [absent(scope)];
}

function absent(area: Area): RecordNode {
  return {
    id: area,
    area,
    name: null,
    present: false,
    fragment: {} as FragmentOf[Area],
    field: [area],
    claims: new Map(),
    elsewhere: [],
    restsOn: [],
    substance: '',
    wording: '',
    accepts: [],
    digest: '',
  };
}
