import { bagFiles } from '../bag/bag-files.ts';
import { portabilityProblems } from '../bag/portable-names.ts';
import type { DossierContent, DossierFile } from '../content.ts';
import { contentsDocument } from '../contents.ts';
import { crateName, payloadPath } from '../layout.ts';
import { payloadOf } from '../payload.ts';
import type { PackedFile } from './packed-file.ts';
import { plainFiles } from './plain-files.ts';

/** A package ready to be written, or why it can't be made, one sentence for each reason. */
export type Prepared =
  | { readonly files: AsyncIterable<PackedFile>; readonly problems: readonly [] }
  | { readonly files: null; readonly problems: readonly string[] };

/** The dossier's documents alone, or with `bagged` in a bag with the study's files. */
export async function packageFiles(
  content: DossierContent,
  documents: readonly DossierFile[],
  bagged: boolean,
): Promise<Prepared> {
  const payload = await payloadOf(content);
  const contents = contentsDocument(content, payload, bagged);
  if (!bagged) {
    // A crate describes files that lie beside it.
    const alone = documents.filter(({ path }) => path !== crateName);
    return { files: plainFiles([...alone, contents]), problems: [] };
  }
  const paths = [...payload.files, ...payload.fetched].map(({ path }) => payloadPath(path));
  const problems = portabilityProblems(paths);
  return problems.length > 0
    ? { files: null, problems }
    : { files: bagFiles(content, payload, [...documents, contents]), problems: [] };
}
