import { randomBytes } from 'node:crypto';
import { lstat, open, readdir, rename, rm, rmdir } from 'node:fs/promises';
import { Failure } from '../../failure.ts';
import type { PackedFile } from '../package/packed-file.ts';
import { writeFolder } from './folder.ts';
import { gzipStored } from './gzip-stored.ts';
import { tarOf } from './tar.ts';
import { formOf } from './target.ts';
import { zipOf } from './zip.ts';

export interface PackageOptions {
  /** Name of the one folder that an archive holds. */
  readonly top: string;
  /** Of every file in an archive. */
  readonly date: Date;
}

/**
 * Writes a package whole or not at all: under a temporary name beside it, then renamed. Never writes over anything; an empty folder
 * is filled. Throws Failure 'unwritable-file'.
 */
export async function writePackage(
  target: string,
  files: AsyncIterable<PackedFile>,
  options: PackageOptions,
): Promise<void> {
  const taken = await whatIsThere(target);
  if (taken === 'something') throw wouldOverwrite(target);
  const temporary = `${target}.${randomBytes(6).toString('hex')}.tmp`;
  try {
    await write(temporary, files, formOf(target), options);
    if (taken === 'empty folder') await rmdir(target);
    await rename(temporary, target);
  } catch (error) {
    await rm(temporary, { recursive: true, force: true }).catch(() => {});
    if (error instanceof Failure) throw error;
    const reason = error instanceof Error ? error.message : String(error);
    throw new Failure(
      'unwritable-file',
      `${target} could not be written (${reason}).`,
      'Nothing was left behind. See that its folder exists, its permissions and the free space; then try again.',
      error,
    );
  }
}

async function write(
  path: string,
  files: AsyncIterable<PackedFile>,
  form: ReturnType<typeof formOf>,
  { top, date }: PackageOptions,
): Promise<void> {
  if (form === 'folder') return writeFolder(path, files);
  const archive = await open(path, 'wx');
  try {
    const chunks = form === 'zip' ? zipOf(files, top, date) : gzipStored(tarOf(files, top, date));
    for await (const chunk of chunks) await archive.writeFile(chunk);
    await archive.sync();
  } finally {
    await archive.close();
  }
}

async function whatIsThere(target: string): Promise<'nothing' | 'empty folder' | 'something'> {
  try {
    const names = await readdir(target);
    return names.length === 0 && formOf(target) === 'folder' ? 'empty folder' : 'something';
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ENOENT') return 'something';
    // A link that leads nowhere is something too.
    return lstat(target).then(
      () => 'something',
      () => 'nothing',
    );
  }
}

function wouldOverwrite(target: string): Failure {
  return new Failure(
    'unwritable-file',
    `${target} is there already, and a dossier is never written over anything.`,
    'Name a new file or an empty folder, or move away what is there.',
  );
}
