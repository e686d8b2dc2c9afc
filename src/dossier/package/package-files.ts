import { bagFiles } from '../bag/bag-files.ts';
import { portabilityProblems } from '../bag/portable-names.ts';
import type { DossierContent, DossierFile } from '../content.ts';
import { contentsDocument } from '../contents.ts';
import { payloadPath } from '../layout.ts';
import { crateDocument, machineDocuments } from '../machine/index.ts';
import { pageDocuments } from '../page/index.ts';
import { payloadOf } from '../payload.ts';
import type { PackedFile } from './packed-file.ts';
import { plainFiles } from './plain-files.ts';

/** A package ready to be written, or why it can't be made, one sentence for each reason. */
export type Prepared =
  | { readonly files: AsyncIterable<PackedFile>; readonly problems: readonly [] }
  | { readonly files: null; readonly problems: readonly string[] };

/** The dossier's documents alone, or with `bagged` in a bag with the study's files. */
export async function packageFiles(content: DossierContent, bagged: boolean): Promise<Prepared> {
  const payload = await payloadOf(content);
  const documents: readonly DossierFile[] = [
    ...(await pageDocuments(content)),
    ...machineDocuments(content),
    contentsDocument(content, payload, bagged),
  ];
  if (!bagged) return { files: plainFiles(documents), problems: [] };
  const paths = [...payload.files, ...payload.fetched].map(({ path }) => payloadPath(path));
  const problems = portabilityProblems(paths);
  if (problems.length > 0) return { files: null, problems };
  // A crate describes files that lie beside it, so only a bag has one.
  const withCrate = [...documents, crateDocument(content, payload, documents)];
  return { files: bagFiles(content, payload, withCrate), problems: [] };
}
