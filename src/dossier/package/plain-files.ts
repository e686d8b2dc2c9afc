import { createHash } from 'node:crypto';
import { manifestText } from '../bag/manifest-lines.ts';
import type { DossierFile } from '../content.ts';
import { fileOfBytes, type PackedFile } from './packed-file.ts';

export const plainManifest = 'manifest-sha256.txt';

/** The documents by themselves with a list of their digests, in code-unit order of path. */
export async function* plainFiles(documents: readonly DossierFile[]): AsyncGenerator<PackedFile> {
  const digests = documents.map(
    ({ path, content }) => [path, createHash('sha256').update(content).digest('hex')] as const,
  );
  const files = [...documents, { path: plainManifest, content: manifestText(new Map(digests)) }];
  for (const { path, content } of files.sort((a, b) => (a.path < b.path ? -1 : 1))) {
    yield fileOfBytes(path, content);
  }
}
