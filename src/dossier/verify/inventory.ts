import { createHash } from 'node:crypto';
import { Failure } from '../../failure.ts';
import type { Limits, PackageProblem } from './findings.ts';
import type { FoundEntry } from './found-entry.ts';
import { whyUnsafe } from './safe-path.ts';

export interface InventoryFile {
  readonly bytes: number;
  readonly sha256: string;
  readonly sha512: string;
  /** Of tag files and of the documents that are compared with each other; null for all others, and where it is no UTF-8. */
  readonly text: string | null;
}

/** All that a package holds, read once from beginning to end. */
export interface Inventory {
  /** By path from the package's top, in one Unicode form (NFC). */
  readonly files: ReadonlyMap<string, InventoryFile>;
  readonly problems: readonly PackageProblem[];
}

const comparedDocuments =
  /^(?:[^/]+\/){0,2}(?:bagit\.txt|bag-info\.txt|fetch\.txt|(?:tag)?manifest-[a-z0-9]+\.txt|[^/]+\.(?:json|cff|html|md))$/;

/** Takes in every entry up to the limits; `maximumBytes` is what all of them together may have. */
export async function takeInventory(
  name: string,
  entries: AsyncIterable<FoundEntry>,
  limits: Limits,
  maximumBytes: number,
): Promise<Inventory> {
  const files = new Map<string, InventoryFile>();
  const problems: PackageProblem[] = [];
  const broken = (file: string, message: string) => problems.push({ kind: 'broken', file, message });
  let count = 0;
  let left = maximumBytes;
  try {
    for await (const entry of entries) {
      const path = entry.path.normalize('NFC').replace(/(?<=.)\/$/, '');
      const unsafe = whyUnsafe(path);
      count += 1;
      if (count > limits.entries) {
        broken(name, `holds more than ${limits.entries} files and folders; the rest was not read`);
        break;
      }
      if (unsafe !== null) broken(path, unsafe);
      else if (entry.kind === 'folder') continue;
      else if (entry.kind === 'link') broken(path, 'is a link; a package holds files only');
      else if (entry.kind === 'other') broken(path, 'is neither a file nor a folder');
      else if (files.has(path)) broken(path, 'is there twice under one name');
      else {
        const file = await readEntry(path, entry, limits, left);
        if (file === null) {
          broken(path, 'grows far beyond the size of the archive; nothing more was read');
          break;
        }
        left -= file.bytes;
        files.set(path, file);
      }
    }
  } catch (error) {
    if (error instanceof Failure) throw error;
    broken(name, `can’t be read to its end (${error instanceof Error ? error.message : String(error)})`);
  }
  return { files: belowOneFolder(files), problems };
}

/** Null where it has more bytes than are left. */
async function readEntry(
  path: string,
  entry: FoundEntry,
  { textBytes }: Limits,
  left: number,
): Promise<InventoryFile | null> {
  const hashes = { sha256: createHash('sha256'), sha512: createHash('sha512') };
  const kept: Uint8Array[] = [];
  let keeps = comparedDocuments.test(path);
  let bytes = 0;
  for await (const chunk of entry.chunks()) {
    bytes += chunk.length;
    if (bytes > left) return null;
    hashes.sha256.update(chunk);
    hashes.sha512.update(chunk);
    keeps &&= bytes <= textBytes;
    if (keeps) kept.push(Uint8Array.from(chunk));
  }
  return {
    bytes,
    sha256: hashes.sha256.digest('hex'),
    sha512: hashes.sha512.digest('hex'),
    text: keeps ? textOf(Buffer.concat(kept)) : null,
  };
}

function textOf(bytes: Uint8Array): string | null {
  try {
    // A mark of byte order is no part of any of these documents, so it has to be seen.
    return new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes);
  } catch {
    return null;
  }
}

/** An archive holds one folder, and that holds the package. */
function belowOneFolder(files: ReadonlyMap<string, InventoryFile>): ReadonlyMap<string, InventoryFile> {
  const [first = ''] = files.keys();
  const top = first.slice(0, first.indexOf('/') + 1);
  const isTop = files.has(`${top}bagit.txt`) || files.has(`${top}manifest-sha256.txt`);
  if (top === '' || !isTop || ![...files.keys()].every((path) => path.startsWith(top))) return files;
  return new Map([...files].map(([path, file]) => [path.slice(top.length), file]));
}
