import { chmod } from 'node:fs/promises';
import { Failure } from '../../failure.ts';
import { writeFileSafely } from '../write-file.ts';

/** Writes a hook whole, with exactly this mode. Throws Failure 'unwritable-file'. */
export async function writeHook(file: string, content: string, mode: number): Promise<void> {
  await writeFileSafely(file, Buffer.from(content, 'latin1'));
  await chmod(file, mode);
}

/** Does something to a file's name or folder. Throws Failure 'unwritable-file'. */
export async function change<Result>(path: string, action: () => Promise<Result>): Promise<Result> {
  try {
    return await action();
  } catch (cause) {
    throw new Failure(
      'unwritable-file',
      `${path} could not be changed (${cause instanceof Error ? cause.message : String(cause)}).`,
      'Check the rights on this folder, then try again; `stoplog hook list` says what is there.',
      cause,
    );
  }
}
