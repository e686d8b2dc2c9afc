import type { DossierContent, DossierStudy } from '../dossier/content.ts';
import { ownFrameworks } from '../dossier/frameworks/own.ts';
import { Failure } from '../failure.ts';
import { discoverManifests } from '../manifest/discover.ts';
import { commitDate } from '../repository/commit-date.ts';
import { ask } from '../repository/git.ts';
import { openSnapshot } from '../repository/open-snapshot.ts';
import { openRepository } from '../repository/repository.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { Verdict } from '../verdict/finding.ts';
import { version } from '../version.ts';
import type { Context } from './command.ts';
import { examineWithFacts } from './examine.ts';
import { onlyFromTop } from './only.ts';

export interface Gathered {
  readonly verdict: Verdict;
  /** Null where a manifest can't be read, so that there is nothing to make a dossier of. */
  readonly content: DossierContent | null;
}

/**
 * Checks a revision as `stoplog check` would have on the day of its commit, and hands on all that was found out while the
 * revision's content is open. `only` is the folder of one manifest; without it all of them are in.
 */
export async function gather<Result>(
  context: Context,
  revision: string,
  use: (gathered: Gathered) => Promise<Result>,
  only?: string,
): Promise<Result> {
  const repository = await openRepository(context.cwd, context.environment);
  const commit = await repository.resolve(revision);
  const committedAt = await ask(repository, commitDate(commit));
  const at = { kind: 'revision', revision: commit } as const;
  const snapshot = await openSnapshot(repository, at, { progress: context.progress });
  try {
    const { studies, verdict } = await examineWithFacts(snapshot, {
      today: committedAt.slice(0, 10),
      only: only === undefined ? undefined : folderOf(only, repository.here, snapshot),
    });
    const read: DossierStudy[] = [];
    for (const { facts, verdict } of studies) {
      if (facts === null) continue;
      read.push({ facts, verdict, frameworks: await ownFrameworks(snapshot, facts.manifest.folder) });
    }
    const draft = verdict.verdict === 'blocked';
    const content = { madeBy: version, commit, committedAt, draft, studies: read, verdict, snapshot };
    return await use({ verdict, content: read.length < studies.length ? null : content });
  } finally {
    await snapshot.close();
  }
}

/** A dossier is of whole studies, never of single records. */
function folderOf(only: string, here: string, snapshot: Snapshot): string {
  const folder = onlyFromTop(only, here, snapshot);
  const folders = discoverManifests(snapshot.entries.keys()).map((manifest) => manifest.folder || '.');
  if (folders.includes(folder)) return folder;
  throw new Failure(
    'usage',
    `\`--only ${only}\` is the folder of no manifest.`,
    `Manifests lie in: ${folders.join(', ')} (from the top of the repository).`,
  );
}
