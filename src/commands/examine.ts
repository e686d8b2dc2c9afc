import { buildFacts } from '../facts/build.ts';
import type { Facts, KnownRules } from '../facts/facts.ts';
import { resealedOf } from '../facts/resealed.ts';
import type { Manifest } from '../manifest/manifest.ts';
import { rememberedManifest } from '../manifest/remembered-manifest.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { knownRules, rules } from '../rules/index.ts';
import type { Phase } from '../rules/rule.ts';
import { runFileRules, runRules } from '../rules/run.ts';
import { againstBase, type Judged } from '../verdict/against-base.ts';
import { changedIn } from '../verdict/changed.ts';
import type { ManifestVerdict, Verdict } from '../verdict/finding.ts';
import { concludeVerdict, judgeManifest, judgeUnread } from '../verdict/judge.ts';
import { type Against, compared } from './comparison.ts';
import { formerly, formerPaths } from './former.ts';
import { type Chosen, choose, pathOf } from './only.ts';
import { readStudies, type Study, type Unread, withoutManifest } from './studies.ts';

export interface ExamineOptions {
  readonly today: string;
  readonly only?: string | undefined;
  /** Judge as if the study had come this far, whatever the manifest says. */
  readonly phase?: Phase | undefined;
  readonly against?: Against | undefined;
}

const known: KnownRules = knownRules();

/** One manifest with its verdict, and what was found out about it; facts are null where it can't be read. */
export interface ExaminedStudy {
  readonly facts: Facts | null;
  readonly verdict: ManifestVerdict;
}

export interface Examined {
  readonly studies: readonly ExaminedStudy[];
  readonly verdict: Verdict;
}

/** The whole check of one snapshot, from its files to the verdict. */
export async function examine(snapshot: Snapshot, options: ExamineOptions): Promise<Verdict> {
  return (await examineWithFacts(snapshot, options)).verdict;
}

/** The same, with the facts that the verdict rests on. A base is examined in the same way, on its own. */
export async function examineWithFacts(snapshot: Snapshot, options: ExamineOptions): Promise<Examined> {
  const { against, only } = options;
  const all = await readStudies(snapshot);
  const chosen = choose(all, only);
  const base = against?.base ?? null;
  const before = base === null ? [] : await examineBase(base, options);
  const former = formerPaths(
    new Map(all.map((study) => [pathOf(study), 'problems' in study ? null : study.manifest])),
    before.flatMap(({ facts }) => facts?.manifest ?? []),
  );
  const studies: ExaminedStudy[] = [];
  for (const study of chosen.studies) {
    const path = pathOf(study);
    const was = former.get(path) ?? path;
    // What this state is compared with takes the place of the commit that it follows.
    const seen =
      base === null
        ? snapshot
        : { ...snapshot, readBefore: (file: string) => base.read(formerly(file, path, was)) };
    const examined =
      'problems' in study
        ? { facts: null, verdict: judgeUnread(runFileRules(rules, study), study.path) }
        : await examineStudy(study, all, seen, chosen, options);
    const same = before.find(({ verdict }) => verdict.path === was);
    // Of a manifest that can't be read nothing is known, so nothing of it is cured.
    if (same === undefined || examined.facts === null) studies.push(examined);
    else {
      const verdict = againstBase(judged(examined), judged(same), chosen.includes);
      const changed = changedIn(examined.facts, await resealedOf(examined.facts, seen));
      const asked = changed.filter(({ record }) => chosen.includes(record));
      studies.push({ ...examined, verdict: { ...verdict, changed: asked } });
    }
  }
  const paths = only === undefined ? all.map(pathOf) : null;
  const inBase = before.map(({ verdict }) => verdict);
  const comparison = against === undefined ? null : compared(against, inBase, paths, former);
  const manifests = studies.map(({ verdict }) => verdict);
  return { studies, verdict: concludeVerdict(snapshot.label, base?.label ?? null, manifests, comparison) };
}

/** Of a base without any manifest nothing is known, and all that is found since is new. */
async function examineBase(
  base: Snapshot,
  { today, phase }: ExamineOptions,
): Promise<readonly ExaminedStudy[]> {
  return examineWithFacts(base, { today, phase }).then(({ studies }) => studies, withoutManifest);
}

function judged({ facts, verdict }: ExaminedStudy): Judged {
  const nodes = [...(facts?.records.nodes.values() ?? [])];
  return { verdict, digests: new Map(nodes.map(({ id, digest }) => [id, digest])) };
}

async function examineStudy(
  study: Study,
  all: readonly (Study | Unread)[],
  snapshot: Snapshot,
  chosen: Chosen,
  { today, phase: asked }: ExamineOptions,
): Promise<ExaminedStudy> {
  const phase = asked ?? study.manifest.data.study?.phase ?? 'setup';
  const facts = await buildFacts({
    ...study,
    snapshot,
    today,
    phase,
    known,
    before: await manifestBefore(study.manifest, snapshot),
    claimedElsewhere: ownedByOthers(study, all),
  });
  const raised = runRules(rules, facts).filter(({ draft }) => chosen.includes(draft.record));
  return { facts, verdict: judgeManifest(raised, facts, phase, chosen.includes) };
}

/** The manifest as it stood in the commit that this snapshot follows; null where there was none, or none that can be read. */
async function manifestBefore(manifest: Manifest, snapshot: Snapshot): Promise<Manifest | null> {
  const bytes = await snapshot.readBefore(manifest.path);
  if (bytes === null) return null;
  const text = new TextDecoder().decode(bytes);
  return text === manifest.text
    ? manifest
    : (await rememberedManifest(manifest.path, text, snapshot)).manifest;
}

function ownedByOthers(
  study: Study,
  all: readonly (Study | Unread)[],
): ReadonlyMap<string, { manifest: string; record: string }> {
  return new Map(
    all.flatMap((other) =>
      'problems' in other || other === study
        ? []
        : [...other.records.nodes.values()].flatMap((record) =>
            [...record.claims.values()]
              .filter((claim) => claim.own)
              .map((claim) => [claim.path, { manifest: other.manifest.path, record: record.id }] as const),
          ),
    ),
  );
}
