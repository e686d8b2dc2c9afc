import { writeFileSync } from 'node:fs';
import { it } from 'vitest';
import { pageDocuments } from '../../../src/dossier/page/index.ts';
import { exampleRepository, withContent } from './content.ts';

it('renders', async () => {
  const repository = await exampleRepository();
  await withContent(repository, async (content) => {
    for (const { path, content: text } of await pageDocuments(content)) {
      writeFileSync(`/tmp/page-out-${path}`, text);
      console.log(path, text.length);
    }
  });
  await repository.remove();
}, 240_000);
