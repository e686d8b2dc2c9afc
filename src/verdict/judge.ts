import type { Facts } from '../facts/facts.ts';
import { type DepartedLevel, departedLevels, loosens } from '../rules/departure.ts';
import type { Phase, Rule } from '../rules/rule.ts';
import type { Raised } from '../rules/run.ts';
import type {
  Comparison,
  DepartureSummary,
  Finding,
  Level,
  ManifestVerdict,
  Totals,
  Verdict,
} from './finding.ts';
import { fingerprint } from './fingerprint.ts';
import { levelOf } from './level.ts';
import { acceptanceFor, waiverFor } from './pass-reason.ts';
import { summarise } from './state.ts';

/** Levels, departures, acceptances and waivers applied to what the rules found in one manifest's records that were asked about. */
export function judgeManifest(
  raised: readonly Raised[],
  facts: Facts,
  phase: Phase,
  asked: (record: string) => boolean = () => true,
): ManifestVerdict {
  const departed = departedRules(facts);
  const findings = raised.map(({ rule, draft }): Finding => {
    const position = facts.manifest.position(draft.field ?? facts.record(draft.record)?.field ?? []);
    return {
      ...common({ rule, draft }, facts.manifest.folder),
      level: levelOf(rule, draft, phase, departed.get(rule.id)),
      file: draft.file ?? facts.manifest.path,
      line: draft.file === undefined ? position.line : (draft.line ?? 1),
      column: draft.file === undefined ? position.column : (draft.column ?? 1),
      waived: waiverFor(rule, draft, facts),
      accepted: acceptanceFor(rule, draft, facts),
    };
  });
  const means = new Map<string, Set<Rule['means']>>();
  for (const { rule, draft } of raised) {
    means.set(draft.record, (means.get(draft.record) ?? new Set<Rule['means']>()).add(rule.means));
  }
  const missing = [...means].filter(([id, of]) => of.has('missing') && !facts.records.nodes.has(id));
  const ids = [...facts.records.nodes.keys(), ...missing.map(([id]) => id)].filter(asked);
  return {
    path: facts.manifest.path,
    study: facts.manifest.data.study?.title ?? facts.manifest.data.study?.id ?? null,
    phase,
    records: ids.map((id) => summarise(id, facts.standings.get(id), means.get(id) ?? new Set())),
    findings: sorted(findings, ids),
    departures: departuresOf(facts),
    cured: [],
    changed: [],
  };
}

/** The verdict on a manifest that could not be read: its faults, all of them blocking. */
export function judgeUnread(raised: readonly Raised[], path: string): ManifestVerdict {
  const findings = raised.map(
    ({ rule, draft }): Finding => ({
      ...common({ rule, draft }, ''),
      level: 'block',
      file: path,
      line: draft.line ?? 1,
      column: draft.column ?? 1,
      waived: null,
      accepted: null,
    }),
  );
  return {
    ...{ path, study: null, phase: 'setup', records: [], departures: [], cured: [], changed: [] },
    findings: sorted(findings, []),
  };
}

/** Whether nothing of a manifest could be read, so that neither its phase nor its records are known. */
export function isUnread({ findings }: ManifestVerdict): boolean {
  return findings.some(({ rule }) => rule === 'manifest.unreadable');
}

/** One verdict over all manifests. */
export function concludeVerdict(
  at: string,
  base: string | null,
  manifests: readonly ManifestVerdict[],
  comparison: Comparison | null = null,
): Verdict {
  const all = manifests.flatMap((one) => one.findings);
  const records = manifests.flatMap((one) => one.records);
  const open = (level: Level) => all.filter((one) => one.level === level && counts(one, comparison)).length;
  const totals: Totals = {
    records: records.length,
    sound: records.filter((one) => one.state === 'sound').length,
    block: open('block'),
    warn: open('warn'),
    note: open('note'),
    waived: all.filter((one) => one.waived !== null).length,
    accepted: all.filter((one) => one.waived === null && one.accepted !== null).length,
    standing: all.filter((one) => one.standing && passes(one) === null).length,
    cured: manifests.reduce((sum, one) => sum + one.cured.length, 0),
  };
  return {
    format: 'stoplog-findings/1',
    at,
    base,
    comparison,
    manifests,
    totals,
    verdict: totals.block > 0 ? 'blocked' : 'pass',
  };
}

/** The signed reason that lets a finding pass, or null. */
export function passes(finding: Finding): string | null {
  return finding.waived ?? finding.accepted;
}

/** Whether a finding counts at its level: nobody's word lets it pass, and it is new, or standing ones are meant too. */
export function counts(finding: Finding, comparison: Comparison | null): boolean {
  return passes(finding) === null && (!finding.standing || comparison?.strict === true);
}

type Placed = 'level' | 'file' | 'line' | 'column' | 'waived' | 'accepted';

function common({ rule, draft }: Raised, folder: string): Omit<Finding, Placed> {
  return {
    rule: rule.id,
    record: draft.record,
    message: draft.message,
    stated: draft.stated ?? null,
    found: draft.found ?? null,
    unit: draft.unit ?? null,
    trail: draft.trail ?? [],
    detail: draft.detail ?? [],
    source: rule.source.citation,
    clear: draft.clear ?? rule.clear,
    standing: false,
    fingerprint: fingerprint(rule.id, draft.record, withoutFolder(draft.subject ?? '', folder)),
  };
}

/** Files in a subject are named from the manifest's folder, so that findings of a model that moves stay the same. */
function withoutFolder(subject: string, folder: string): string {
  return folder === '' ? subject : ` ${subject}`.replaceAll(` ${folder}/`, ' ').slice(1);
}

const levels: readonly Level[] = ['block', 'warn', 'note'];

function sorted(findings: readonly Finding[], ids: readonly string[]): readonly Finding[] {
  const place = new Map(ids.map((id, index) => [id, index]));
  const key = (one: Finding) => [
    one.rule === 'manifest.loosened' ? 0 : 1,
    levels.indexOf(one.level),
    place.get(one.record) ?? -1,
    one.line,
  ];
  return [...findings].sort((a, b) => {
    const [left, right] = [key(a), key(b)];
    const differing = left.findIndex((value, index) => value !== right[index]);
    if (differing >= 0) return (left[differing] ?? 0) - (right[differing] ?? 0);
    const [x, y] = [`${a.rule}\0${a.fingerprint}`, `${b.rule}\0${b.fingerprint}`];
    return x < y ? -1 : x > y ? 1 : 0;
  });
}

function departedRules(facts: Facts): ReadonlyMap<string, DepartedLevel> {
  return new Map(
    (facts.manifest.data.departures ?? []).flatMap(({ rule, now }) =>
      rule !== undefined && typeof now === 'string' && now in departedLevels
        ? [[rule, now as DepartedLevel] as const]
        : [],
    ),
  );
}

function departuresOf(facts: Facts): readonly DepartureSummary[] {
  return (facts.manifest.data.departures ?? []).map((one) => ({
    of: one.rule ?? one.threshold ?? '',
    now: String(one.now ?? ''),
    because: one.because ?? '',
    loosens: loosens(one, facts.known),
  }));
}
