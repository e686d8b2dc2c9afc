import { createReadStream } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import { createGunzip } from 'node:zlib';
import { extract } from 'tar-stream';
import type { FoundEntry } from './found-entry.ts';

const kinds: Readonly<Record<string, FoundEntry['kind']>> = {
  file: 'file',
  directory: 'folder',
  link: 'link',
  symlink: 'link',
};

/** Every entry of a `.tar.gz`, as it comes. Fails where the archive unpacks to more bytes than the maximum. */
export async function* readTar(file: string, maximumBytes: number): AsyncGenerator<FoundEntry> {
  const tar = extract();
  const bounded = (chunks: AsyncIterable<Uint8Array>) => upTo(maximumBytes, chunks);
  // Its failure ends the entries, too.
  pipeline(createReadStream(file), createGunzip(), bounded, tar).catch((error: Error) => tar.destroy(error));
  for await (const entry of tar) {
    const { name, type } = entry.header;
    const kind = kinds[type ?? ''] ?? 'other';
    yield { path: name, kind, chunks: () => entry as AsyncIterable<Uint8Array> };
    entry.resume();
  }
}

async function* upTo(maximumBytes: number, chunks: AsyncIterable<Uint8Array>): AsyncGenerator<Uint8Array> {
  let bytes = 0;
  for await (const chunk of chunks) {
    bytes += chunk.length;
    if (bytes > maximumBytes) throw new Error('it grows far beyond its size');
    yield chunk;
  }
}
