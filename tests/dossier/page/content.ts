import { cp, readFile, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { gather } from '../../../src/commands/gather.ts';
import type { DossierContent } from '../../../src/dossier/content.ts';
import {
  cleanEnvironment,
  gitIn,
  type TemporaryRepository,
  temporaryRepository,
} from '../../harness/repository.ts';

const example = join(import.meta.dirname, '../../../example-project');

/** The example project as the one commit of a repository; `edit` changes its manifest before. */
export async function exampleRepository(edit = (manifest: string) => manifest): Promise<TemporaryRepository> {
  const repository = await temporaryRepository();
  await cp(example, repository.folder, { recursive: true });
  await rm(join(repository.folder, 'radar'), { recursive: true, force: true });
  const manifest = await readFile(join(example, 'stoplog.yaml'), 'utf8');
  await repository.write('stoplog.yaml', edit(manifest));
  await commitAll(repository);
  return repository;
}

/** On an invented day, always the same. */
export async function commitAll({ folder }: TemporaryRepository): Promise<void> {
  const date = '2025-03-12T09:00:00Z';
  const git = gitIn(folder, { GIT_AUTHOR_DATE: date, GIT_COMMITTER_DATE: date });
  await git('add', '--all');
  await git('commit', '--quiet', '--message', 'The model');
}

/** Works on all of HEAD that a page is made of, while its content is open. */
export function withContent<Result>(
  { folder }: TemporaryRepository,
  use: (content: DossierContent) => Promise<Result>,
): Promise<Result> {
  const context = {
    cwd: folder,
    environment: cleanEnvironment(),
    today: '2025-03-12',
    color: false,
    write: () => {},
    tell: () => {},
    progress: () => {},
  };
  return gather(context, 'HEAD', ({ content }) => {
    if (content === null) throw new Error('the manifest can’t be read');
    return use(content);
  });
}
