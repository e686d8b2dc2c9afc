import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { realpath, stat } from 'node:fs/promises';
import { join, sep } from 'node:path';
import { Failure } from '../failure.ts';
import type { DiskFile, Snapshot } from './snapshot.ts';

/**
 * Size and SHA-256 of a file in the work tree's folder, tracked or not; null where there is none, and where the path leads out
 * of the folder. It is hashed again only when its size, times or place on the disk change.
 */
export async function fileBeside(
  top: string,
  path: string,
  remember: Snapshot['remember'],
): Promise<DiskFile | null> {
  const file = await realpath(join(top, path)).catch(() => null);
  if (file === null || !file.startsWith((await realpath(top)) + sep)) return null;
  const found = await stat(file, { bigint: true });
  if (!found.isFile()) return null;
  const state = `beside 1 ${file} ${found.size} ${found.mtimeNs} ${found.ctimeNs} ${found.ino}`;
  const key = createHash('sha256').update(state).digest('hex');
  return { bytes: Number(found.size), sha256: await remember(key, () => digestOf(file)) };
}

async function digestOf(file: string): Promise<string> {
  const hash = createHash('sha256');
  try {
    for await (const chunk of createReadStream(file, { highWaterMark: 1024 * 1024 })) hash.update(chunk);
  } catch (cause) {
    const why = cause instanceof Error ? cause.message : String(cause);
    throw new Failure(
      'unreadable-file',
      `${file} could not be read (${why}).`,
      'Check its permissions.',
      cause,
    );
  }
  return hash.digest('hex');
}
