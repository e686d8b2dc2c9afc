import { writeFileSync } from 'node:fs';
import { it } from 'vitest';
import { pageDocuments } from '../../../src/dossier/page/index.ts';
import { contentOf, exampleRepository } from './content.ts';

it('renders', async () => {
  const repository = await exampleRepository();
  const content = await contentOf(repository);
  const t = Date.now();
  for (const { path, content: text } of await pageDocuments(content)) {
    writeFileSync(`/tmp/page-out-${path}`, text);
    console.log(path, text.length, Date.now() - t);
  }
  await content.snapshot.close();
  await repository.remove();
}, 240_000);
