import { decodePath } from '../bag/manifest-lines.ts';
import type { PackageProblem } from './findings.ts';
import { whyUnsafe } from './safe-path.ts';

/** A list of digests, read. */
export interface ReadManifest {
  readonly name: string;
  /** `sha256`, `sha512`, or another that is not checked here. */
  readonly algorithm: string;
  /** Path in one Unicode form (NFC) -> digest in lower case. */
  readonly digests: ReadonlyMap<string, string>;
  readonly problems: readonly PackageProblem[];
}

const digestDigits: Readonly<Record<string, number>> = { sha256: 64, sha512: 128 };

/** Reads `manifest-sha256.txt` and its like: a digest, blanks, a path on each line (RFC 8493, 2.1.3). */
export function readManifest(name: string, text: string | null): ReadManifest {
  const algorithm = /manifest-([a-z0-9]+)\.txt$/.exec(name)?.[1] ?? '';
  const digests = new Map<string, string>();
  const problems: PackageProblem[] = [];
  const broken = (message: string) => problems.push({ kind: 'broken', file: name, message });
  if (text === null) broken('is no UTF-8 text of ordinary size');
  for (const [place, line] of linesOf(text ?? '').entries()) {
    const [, digest = '', written = ''] = /^([0-9a-f]+)[ \t]+\*?(.+)$/isu.exec(line) ?? [];
    const path = decodePath(written).normalize('NFC');
    const unsafe = whyUnsafe(path);
    const where = `line ${place + 1}`;
    if (digest.length !== (digestDigits[algorithm] ?? digest.length) || digest === '') {
      broken(
        `${where}: expected a digest (${algorithm}) and a path, found ${JSON.stringify(line.slice(0, 200))}`,
      );
    } else if (unsafe !== null) broken(`${where}: ${JSON.stringify(path)} ${unsafe}`);
    else if (digests.has(path)) broken(`${where}: lists ${JSON.stringify(path)} for the second time`);
    else digests.set(path, digest.toLowerCase());
  }
  return { name, algorithm, digests, problems };
}

/** Lines ended by LF, CR or CRLF (RFC 8493, 7). */
export function linesOf(text: string): readonly string[] {
  const lines = text.split(/\r\n|\n|\r/);
  if (lines.at(-1) === '') lines.pop();
  return lines;
}
