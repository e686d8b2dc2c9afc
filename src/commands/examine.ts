import { buildFacts } from '../facts/build.ts';
import type { Facts, KnownRules } from '../facts/facts.ts';
import type { Manifest } from '../manifest/manifest.ts';
import { readManifest } from '../manifest/read.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { knownRules, rules } from '../rules/index.ts';
import type { Phase } from '../rules/rule.ts';
import { runFileRules, runRules } from '../rules/run.ts';
import type { ManifestVerdict, Verdict } from '../verdict/finding.ts';
import { concludeVerdict, judgeManifest, judgeUnread } from '../verdict/judge.ts';
import { type Chosen, choose } from './only.ts';
import { readStudies, type Study, type Unread } from './studies.ts';

export interface ExamineOptions {
  readonly today: string;
  readonly only?: string | undefined;
  /** Judge as if the study had come this far, whatever the manifest says. */
  readonly phase?: Phase | undefined;
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

/** The same, with the facts that the verdict rests on. */
export async function examineWithFacts(snapshot: Snapshot, options: ExamineOptions): Promise<Examined> {
  const all = await readStudies(snapshot);
  const chosen = choose(all, options.only);
  const studies: ExaminedStudy[] = [];
  for (const study of chosen.studies) {
    studies.push(
      'problems' in study
        ? { facts: null, verdict: judgeUnread(runFileRules(rules, study), study.path) }
        : await examineStudy(study, all, snapshot, chosen, options),
    );
  }
  const manifests = studies.map(({ verdict }) => verdict);
  return { studies, verdict: concludeVerdict(snapshot.label, null, manifests) };
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
  // Reading a manifest costs more than the rest of a check, and most commits leave it as it is.
  return text === manifest.text ? manifest : readManifest(manifest.path, text).manifest;
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
