import { cp, readFile, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { readStudies } from '../../../src/commands/studies.ts';
import type { DossierContent, DossierStudy } from '../../../src/dossier/content.ts';
import { buildFacts } from '../../../src/facts/build.ts';
import { openSnapshot } from '../../../src/repository/open-snapshot.ts';
import { openRepository } from '../../../src/repository/repository.ts';
import { knownRules, rules } from '../../../src/rules/index.ts';
import { runRules } from '../../../src/rules/run.ts';
import { concludeVerdict, judgeManifest } from '../../../src/verdict/judge.ts';
import { type TemporaryRepository, temporaryRepository } from '../../harness/repository.ts';

const example = join(import.meta.dirname, '../../../example-project');

/** The example project as the one commit of a repository; `edit` changes its manifest before. */
export async function exampleRepository(edit = (manifest: string) => manifest): Promise<TemporaryRepository> {
  const repository = await temporaryRepository();
  await cp(example, repository.folder, { recursive: true });
  await rm(join(repository.folder, 'radar'), { recursive: true, force: true });
  const manifest = await readFile(join(example, 'stoplog.yaml'), 'utf8');
  await repository.write('stoplog.yaml', edit(manifest));
  await repository.git('add', '--all');
  await repository.git('commit', '--quiet', '--message', 'The model', '--date', '2025-03-12T09:00:00Z');
  return repository;
}

/** All of HEAD that a page is made of; the caller closes its snapshot. */
export async function contentOf({ folder, environment }: TemporaryRepository): Promise<DossierContent> {
  const repository = await openRepository(folder, environment);
  const snapshot = await openSnapshot(repository, { kind: 'revision', revision: 'HEAD' });
  const studies: DossierStudy[] = [];
  for (const study of await readStudies(snapshot)) {
    if ('problems' in study) continue;
    const phase = study.manifest.data.study?.phase ?? 'setup';
    const given = {
      today: '2025-03-12',
      phase,
      known: knownRules(),
      before: null,
      claimedElsewhere: new Map(),
    };
    const facts = await buildFacts({ ...study, ...given, snapshot });
    studies.push({ facts, verdict: judgeManifest(runRules(rules, facts), facts, phase) });
  }
  const verdict = concludeVerdict(
    snapshot.label,
    null,
    studies.map((study) => study.verdict),
  );
  return {
    madeBy: '0.1.0',
    commit: snapshot.commit ?? '',
    committedAt: '2025-03-12T09:00:00Z',
    draft: verdict.verdict !== 'pass',
    studies,
    verdict,
    snapshot,
  };
}
