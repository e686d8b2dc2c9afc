import { isUtf8 } from 'node:buffer';
import { type Entry, openPromise, type ZipFile } from 'yauzl';
import type { FoundEntry } from './found-entry.ts';

/** The type of a file in the mode that Unix keeps; 0 where the archive was made elsewhere. */
const typeBits = 0o170000;
const ordinary = 0o100000;
const link = 0o120000;

/** Every entry of a zip archive. Names are judged by who reads this, and not by the library. */
export async function* readZip(file: string): AsyncGenerator<FoundEntry> {
  const zip = await openPromise(file, { lazyEntries: true, decodeStrings: false, autoClose: false });
  try {
    for await (const entry of zip.eachEntry()) {
      const bytes = entry.fileNameRaw;
      const path = bytes.toString(isUtf8(bytes) ? 'utf8' : 'latin1');
      const type = (entry.externalFileAttributes >>> 16) & typeBits;
      const isFolder = path.endsWith('/');
      yield { path, kind: isFolder ? 'folder' : kindOf(type), chunks: () => contentOf(zip, entry) };
    }
  } finally {
    zip.close();
  }
}

async function* contentOf(zip: ZipFile, entry: Entry): AsyncGenerator<Uint8Array> {
  for await (const chunk of await zip.openReadStreamPromise(entry)) yield chunk as Uint8Array;
}

function kindOf(type: number): FoundEntry['kind'] {
  if (type === link) return 'link';
  return type === 0 || type === ordinary ? 'file' : 'other';
}
