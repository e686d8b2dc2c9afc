import { createReadStream } from 'node:fs';
import { stat } from 'node:fs/promises';
import { join } from 'node:path';
import { blobFrom, type FoundBlob } from './blobs.ts';
import type { Pointer } from './pointer.ts';

/** Finds the content that a Git LFS pointer names, where it was fetched; null elsewhere. */
export type FindLarge = (pointer: Pointer) => Promise<FoundBlob | null>;

/** Looks where Git LFS keeps content: `lfs/objects` below the common git directory. A file of another size is not that content. */
export function largeFilesIn(commonDirectory: string): FindLarge {
  return async ({ sha256, bytes, extended }) => {
    if (extended) return null;
    const file = join(commonDirectory, 'lfs', 'objects', sha256.slice(0, 2), sha256.slice(2, 4), sha256);
    const found = await stat(file).catch(() => null);
    if (found?.size !== bytes) return null;
    return blobFrom(bytes, () => createReadStream(file, { highWaterMark: 256 * 1024 }));
  };
}
