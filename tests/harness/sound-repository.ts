import { cp, mkdtemp, readFile, realpath, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { stoplog } from './command.ts';
import { gitIn, type TemporaryRepository, temporaryRepository } from './repository.ts';
import { soundFiles } from './sound-files.ts';
import { type Edits, manifestText } from './study.ts';

/** A repository with the sound study, sealed and committed, and ways to work in it. */
export interface SoundRepository extends Pick<TemporaryRepository, 'folder' | 'git' | 'remove'> {
  read(path: string): Promise<string>;
  write(path: string, content: string): Promise<void>;
  /** Rewrites a file from its old content. */
  edit(path: string, change: (old: string) => string): Promise<void>;
  /** Writes the sound manifest with these edits. */
  state(edits: Edits): Promise<void>;
  commit(message?: string): Promise<void>;
}

let template: Promise<string> | undefined;

/** Made once in a process and copied: a hundred small git commands cost more than one copy. */
async function sealedTemplate(): Promise<string> {
  const { folder, git } = await temporaryRepository({ ...soundFiles(), 'stoplog.yaml': manifestText({}) });
  const { status, text, failure } = await stoplog(folder, ['seal', '--all'], '2021-02-01');
  if (status !== 0) throw failure ?? new Error(text);
  await git('add', '--all');
  await git('commit', '--quiet', '--message', 'Seal what was reviewed');
  return folder;
}

export async function soundRepository(): Promise<SoundRepository> {
  template ??= sealedTemplate();
  const folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
  await cp(await template, folder, { recursive: true });
  return workingIn(folder);
}

/** The same ways of working in another folder, such as a linked work tree. */
export function workingIn(folder: string): SoundRepository {
  const git = gitIn(folder);
  const read = (path: string) => readFile(join(folder, path), 'utf8');
  const write = (path: string, content: string) => writeFile(join(folder, path), content);
  return {
    folder,
    git,
    read,
    write,
    edit: async (path, change) => {
      const old = await read(path);
      const now = change(old);
      if (now === old) throw new Error(`the edit of ${path} changes nothing`);
      await write(path, now);
    },
    state: (edits) => write('stoplog.yaml', manifestText(edits)),
    commit: async (message = 'Work') => {
      await git('add', '--all');
      await git('commit', '--quiet', '--message', message);
    },
    remove: () => rm(folder, { recursive: true, force: true }),
  };
}

/** Adds 20 mm to the rain of one day of a table `date,rain_mm`. */
export function moreRain(day: string): (table: string) => string {
  return (table) =>
    table.replace(new RegExp(`^${day},([0-9.]+)`, 'm'), (_, rain: string) => `${day},${Number(rain) + 20}`);
}
