import { execFile } from 'node:child_process';
import { mkdtemp, realpath, rm, symlink } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { delimiter, join, resolve } from 'node:path';
import { promisify } from 'node:util';
import { cleanEnvironment } from './repository.ts';

const run = promisify(execFile);

export interface Told {
  readonly done: boolean;
  /** Standard output, then standard error. */
  readonly words: string;
}

/** The bundle as a person has it on PATH after a global installation. */
export interface Installed {
  /** On PATH; tests may keep other things in it. */
  readonly folder: string;
  /** git in a folder as typed in a shell, hooks and all. */
  git(place: string, ...words: readonly string[]): Promise<Told>;
  remove(): Promise<void>;
}

export async function installed(): Promise<Installed> {
  const folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-tools-')));
  await symlink(resolve('dist/stoplog.mjs'), join(folder, 'stoplog'));
  const env = cleanEnvironment({ PATH: `${folder}${delimiter}${process.env.PATH}` });
  return {
    folder,
    git: (place, ...words) =>
      run('git', words, { cwd: place, env }).then(
        ({ stdout, stderr }) => ({ done: true, words: stdout + stderr }),
        (error: { stdout: string; stderr: string }) => ({ done: false, words: error.stdout + error.stderr }),
      ),
    remove: () => rm(folder, { recursive: true }),
  };
}
