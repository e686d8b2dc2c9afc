import { execFileSync } from 'node:child_process';
import { chmod, mkdir, mkdtemp, readFile, realpath, rm, symlink, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** One start of the stand-in, as it saw it. */
export interface Call {
  readonly words: readonly string[];
  readonly cwd: string;
  /** The tree that the index would make: what a commit is about to hold. */
  readonly tree: string;
  readonly environment: Readonly<Record<string, string>>;
}

/** A program that stands in for Stoplog: it notes how it was started and ends as it was told. */
export interface StandIn {
  /** The program itself, to be copied elsewhere. */
  readonly program: string;
  /** Folder for PATH: `stoplog`. */
  readonly withStoplog: string;
  /** Folder for PATH: `node`. */
  readonly withNode: string;
  /** Folder for PATH: what a hook needs beside those two, so that nothing else of this machine is found. */
  readonly withTools: string;
  /** Variables with all three on PATH and nothing else, as a graphical program might have it. */
  readonly everyday: NodeJS.ProcessEnv;
  /** Variables with a PATH of the folders given, in their order. */
  path(...folders: readonly string[]): NodeJS.ProcessEnv;
  endWith(status: number): Promise<void>;
  /** The calls since the last time this was asked. */
  calls(): Promise<readonly Call[]>;
  remove(): Promise<void>;
}

const program = `#!/usr/bin/env node
import { execFileSync } from 'node:child_process';
import { appendFileSync, readFileSync } from 'node:fs';
const folder = process.env.STAND_IN;
const environment = Object.fromEntries(
  Object.entries(process.env).filter(([name]) => /^(GIT_|NODE_EXTRA|STOPLOG_|MARK)/.test(name)),
);
const tree = execFileSync('git', ['write-tree'], { encoding: 'utf8' }).trim();
const call = { words: process.argv.slice(2), cwd: process.cwd(), tree, environment };
appendFileSync(folder + '/calls', JSON.stringify(call) + '\\n');
console.error('the stand-in speaks');
process.exitCode = Number(readFileSync(folder + '/status', 'utf8'));
`;

export async function standIn(): Promise<StandIn> {
  const folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-stand-in-')));
  const [withStoplog, withNode, withTools] = [
    join(folder, 'stoplog'),
    join(folder, 'node'),
    join(folder, 'tools'),
  ];
  for (const one of [withStoplog, withNode, withTools]) await mkdir(one);
  const file = join(folder, 'stoplog.mjs');
  await writeFile(file, program);
  await chmod(file, 0o755);
  await symlink(file, join(withStoplog, 'stoplog'));
  await symlink(process.execPath, join(withNode, 'node'));
  for (const tool of ['sh', 'git', 'cat', 'sort', 'env', 'dirname', 'basename']) {
    const found = execFileSync('sh', ['-c', `command -v ${tool}`], { encoding: 'utf8' }).trim();
    await symlink(await realpath(found), join(withTools, tool));
  }
  await writeFile(join(folder, 'status'), '0');
  await writeFile(join(folder, 'calls'), '');
  const path: StandIn['path'] = (...folders) => ({ PATH: folders.join(':'), STAND_IN: folder });
  return {
    program: file,
    ...{ withStoplog, withNode, withTools, path },
    everyday: path(withStoplog, withNode, withTools),
    endWith: (status) => writeFile(join(folder, 'status'), String(status)),
    async calls() {
      const lines = (await readFile(join(folder, 'calls'), 'utf8')).split('\n');
      await writeFile(join(folder, 'calls'), '');
      return lines.filter((line) => line !== '').map((line) => JSON.parse(line) as Call);
    },
    remove: () => rm(folder, { recursive: true, force: true }),
  };
}
