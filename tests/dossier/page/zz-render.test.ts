import { writeFileSync } from 'node:fs';
import { it } from 'vitest';
import { pageDocuments } from '../../../src/dossier/page/index.ts';
import { exampleRepository, withContent } from './content.ts';
import { hostileManifest } from './hostile.ts';

it.each([
  ['sound', (m: string) => m],
  ['hostile', hostileManifest],
] as const)(
  'renders %s',
  async (name, edit) => {
    const repository = await exampleRepository(edit);
    await withContent(repository, async (content) => {
      for (const { path, content: text } of await pageDocuments(content)) {
        writeFileSync(`/tmp/${name}-${path}`, text);
        console.log(path, text.length);
      }
    });
    await repository.remove();
  },
  240_000,
);
