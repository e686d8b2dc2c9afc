import type { DossierContent } from '../../content.ts';
import { type Payload, payloadOf } from '../../payload.ts';
import { type Block, heading, paragraph, type Text, tableOr } from '../document.ts';

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
      rowsOf(payload),
    ),
  ];
}

function rowsOf({ fetched, absent }: Payload): readonly (readonly Text[])[] {
  const rows = [
    ...fetched.map((file) => ({ ...file, note: `kept outside git; to be fetched from ${file.url}` })),
    ...absent.map((file) => ({
      ...file,
      note: file.location === null ? file.why : `${file.why}; it is kept at ${file.location}`,
    })),
  ];
  return rows
    .sort((a, b) => (a.path < b.path ? -1 : 1))
    .map(({ path, bytes, sha256, note }) => [
      { code: path },
      bytes === null ? 'not stated' : String(bytes),
      sha256 === null ? 'not stated' : { code: sha256 },
      note,
    ]);
}
