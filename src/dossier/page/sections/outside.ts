import type { DossierContent } from '../../content.ts';
import { outsideFiles, payloadOf } from '../../payload.ts';
import { type Block, heading, paragraph, type Text, tableOr } from '../document.ts';
import { notStated } from '../say.ts';

/** Files of the study that lie in no package, and why; the rest lies in a bag. */
export async function outsideSection(content: DossierContent): Promise<readonly Block[]> {
  const payload = await payloadOf(content);
  return [
    heading(1, 'What is in no package', 'outside'),
    paragraph(
      `A package made with --bag holds the ${payload.files.length} files of this commit that are at hand, below repository/; contents.json lists each with its SHA-256.`,
    ),
    tableOr(
      'No file of the study is left out.',
      'Files that have to be had from elsewhere',
      ['File', 'Bytes', 'SHA-256', 'Why, and where it is'],
      outsideFiles(payload).map(({ path, bytes, sha256, note }): readonly Text[] => [
        { code: path },
        bytes === null ? notStated : String(bytes),
        sha256 === null ? notStated : { code: sha256 },
        note,
      ]),
    ),
  ];
}
