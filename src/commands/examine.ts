import { buildFacts } from '../facts/build.ts';
import type { KnownRules } from '../facts/facts.ts';
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

/** The whole check of one snapshot, from its files to the verdict. */
export async function examine(snapshot: Snapshot, options: ExamineOptions): Promise<Verdict> {
  const all = await readStudies(snapshot);
  const chosen = choose(all, options.only);
  const manifests: ManifestVerdict[] = [];
  for (const study of chosen.studies) {
    manifests.push(
      'problems' in study
        ? judgeUnread(runFileRules(rules, study), study.path)
        : await examineStudy(study, all, snapshot, chosen, options),
    );
  }
  return concludeVerdict(snapshot.label, null, manifests);
}

async function examineStudy(
  study: Study,
  all: readonly (Study | Unread)[],
  snapshot: Snapshot,
  chosen: Chosen,
  { today, phase: asked }: ExamineOptions,
): Promise<ManifestVerdict> {
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
  return judgeManifest(raised, facts, phase, chosen.includes);
}

/** The manifest as it stood in the commit that this snapshot follows; null where there was none, or none that can be read. */
async function manifestBefore(manifest: Manifest, snapshot: Snapshot): Promise<Manifest | null> {
  const bytes = await snapshot.readBefore(manifest.path);
  return bytes === null ? null : readManifest(manifest.path, new TextDecoder().decode(bytes)).manifest;
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
