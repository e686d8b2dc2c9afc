import type { DossierContent } from '../content.ts';
import { dossierIdentifier } from '../identifier.ts';
import { payloadPath } from '../layout.ts';
import type { FetchedFile } from '../payload.ts';
import { encodePath } from './manifest-lines.ts';

/** RFC 8493, 2.1.1: these two lines and nothing else. */
export const declaration = 'BagIt-Version: 1.0\nTag-File-Character-Encoding: UTF-8\n';

/** Sizes of all payload files, those to be fetched too; null where one is not known. */
export type PayloadSizes = readonly (number | null)[];

/** `bag-info.txt` (2.2.2). Without the Payload-Oxum where the size of a file that is to be fetched is not stated. */
export function bagInfo(content: DossierContent, sizes: PayloadSizes): string {
  const titles = content.studies.map(({ facts }) => facts.manifest.data.study?.title ?? facts.manifest.path);
  const known = sizes.filter((size) => size !== null);
  const oxum = `${known.reduce((sum, size) => sum + size, 0)}.${known.length}`;
  const lines: readonly (readonly [label: string, value: string])[] = [
    ['Bag-Software-Agent', `Stoplog ${content.madeBy}`],
    ['Bagging-Date', content.committedAt.slice(0, 10)],
    ['External-Description', `${content.draft ? 'DRAFT. ' : ''}${titles.join('; ')}`],
    ['External-Identifier', `urn:uuid:${dossierIdentifier(content)}`],
    ['Internal-Sender-Identifier', `git commit ${content.commit}`],
    ...(known.length === sizes.length ? ([['Payload-Oxum', oxum]] as const) : []),
  ];
  return lines.map(([label, value]) => `${label}: ${oneLine(value)}\n`).join('');
}

/** `fetch.txt` (2.2.3): address, length or `-`, path. */
export function fetchText(fetched: readonly FetchedFile[]): string {
  return fetched
    .map(({ url, bytes, path }) => `${url} ${bytes ?? '-'} ${encodePath(`data/${payloadPath(path)}`)}\n`)
    .join('');
}

/** A value without line breaks and other control characters. */
function oneLine(text: string): string {
  return text.replace(/[\s\p{Cc}]+/gu, ' ').trim();
}
