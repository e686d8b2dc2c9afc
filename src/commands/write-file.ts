import { randomBytes } from 'node:crypto';
import { mkdir, open, realpath, rename, rm, stat, writeFile } from 'node:fs/promises';
import { dirname } from 'node:path';
import { Failure } from '../failure.ts';

/**
 * Writes a file whole or not at all: to a temporary file beside it, then renamed. Makes the folders that it lacks, keeps the mode of
 * a file that is there, and writes through a link to the file it leads to. Throws Failure 'unwritable-file'.
 */
export async function writeFileSafely(path: string, content: string | Uint8Array): Promise<void> {
  const target = await realpath(path).catch(() => path);
  const there = await stat(target).catch(() => null);
  // A device or a pipe (`/dev/null`, `/dev/stdout`) is written to, never replaced by a file.
  if (there !== null && !there.isFile() && !there.isDirectory()) return writeFile(target, content);
  const temporary = `${target}.${randomBytes(6).toString('hex')}.tmp`;
  try {
    await mkdir(dirname(target), { recursive: true });
    const mode = there === null ? 0o666 : there.mode & 0o777;
    const file = await open(temporary, 'wx', mode);
    try {
      // The mask of new files does not apply to one that was there.
      if (mode !== 0o666) await file.chmod(mode);
      await file.writeFile(content);
      await file.sync();
    } finally {
      await file.close();
    }
    await rename(temporary, target);
  } catch (error) {
    await rm(temporary, { force: true }).catch(() => {});
    const reason = error instanceof Error ? error.message : String(error);
    throw new Failure(
      'unwritable-file',
      `${path} could not be written (${reason}).`,
      'Nothing was changed. Check the folder’s permissions and the free space, then try again.',
      error,
    );
  }
}
