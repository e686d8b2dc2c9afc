import { decodePath } from '../bag/manifest-lines.ts';
import type { PackageProblem } from './findings.ts';
import { linesOf } from './read-manifest.ts';
import { whyUnsafe } from './safe-path.ts';

/** What `fetch.txt` (RFC 8493, 2.2.3) says of one file; nothing is ever fetched here. */
export interface ToFetch {
  readonly url: string;
  /** Null where it stands as `-`. */
  readonly bytes: number | null;
}

export interface ReadFetch {
  readonly files: ReadonlyMap<string, ToFetch>;
  readonly problems: readonly PackageProblem[];
}

export const fetchName = 'fetch.txt';

export function readFetch(text: string | null): ReadFetch {
  const files = new Map<string, ToFetch>();
  const problems: PackageProblem[] = [];
  const broken = (message: string) => problems.push({ kind: 'broken', file: fetchName, message });
  if (text === null) broken('is no UTF-8 text of ordinary size');
  for (const [place, line] of linesOf(text ?? '').entries()) {
    const [, url = '', length = '', written = ''] = /^(\S+)[ \t]+(\d+|-)[ \t]+(.+)$/su.exec(line) ?? [];
    const path = decodePath(written).normalize('NFC');
    const unsafe = whyUnsafe(path);
    const where = `line ${place + 1}`;
    if (!URL.canParse(url)) {
      broken(
        `${where}: expected an address, a size or \`-\`, and a path, found ${JSON.stringify(line.slice(0, 200))}`,
      );
    } else if (unsafe !== null) broken(`${where}: ${JSON.stringify(path)} ${unsafe}`);
    else if (!path.startsWith('data/')) broken(`${where}: ${JSON.stringify(path)} lies outside data/`);
    else if (files.has(path)) broken(`${where}: lists ${JSON.stringify(path)} for the second time`);
    else files.set(path, { url, bytes: length === '-' ? null : Number(length) });
  }
  return { files, problems };
}
