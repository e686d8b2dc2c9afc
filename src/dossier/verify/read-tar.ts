import { createReadStream } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import { createGunzip } from 'node:zlib';
import { extract } from 'tar-stream';
import type { FoundEntry } from './found-entry.ts';

/** Every entry of a `.tar.gz` but folders, as it comes. */
export async function* readTar(file: string): AsyncGenerator<FoundEntry> {
  const tar = extract();
  // Its failure ends the entries, too.
  pipeline(createReadStream(file), createGunzip(), tar).catch((error: Error) => tar.destroy(error));
  for await (const entry of tar) {
    const { name, type } = entry.header;
    const kind = type === 'file' ? 'file' : type === 'link' || type === 'symlink' ? 'link' : 'other';
    if (type !== 'directory') yield { path: name, kind, chunks: () => entry as AsyncIterable<Uint8Array> };
    entry.resume();
  }
}
