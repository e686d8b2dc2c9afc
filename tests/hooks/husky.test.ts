import { execFileSync } from 'node:child_process';
import { copyFile, mkdir, readFile, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, afterEach, beforeAll, beforeEach, expect, it } from 'vitest';
import { addHooks } from '../../src/commands/hook/add.ts';
import { listHooks } from '../../src/commands/hook/report.ts';
import { openRepository } from '../../src/repository/repository.ts';
import {
  cleanEnvironment,
  gitIn,
  type TemporaryRepository,
  temporaryRepository,
} from '../harness/repository.ts';
import { type StandIn, standIn } from './stand-in.ts';

let stoplog: StandIn;
let repository: TemporaryRepository;
let git: (...words: string[]) => Promise<string>;

beforeAll(async () => {
  stoplog = await standIn();
});
afterAll(() => stoplog.remove());

const husky = fileURLToPath(new URL('bin.js', import.meta.resolve('husky')));

beforeEach(async () => {
  repository = await temporaryRepository({
    'rain.csv': '1\n',
    'package.json': '{"scripts":{"prepare":"husky"}}',
  });
  git = gitIn(repository.folder, stoplog.everyday);
  await stoplog.endWith(0);
  await stoplog.calls();
});
afterEach(() => repository.remove());

const setUp = () =>
  execFileSync(process.execPath, [husky], { cwd: repository.folder, env: cleanEnvironment() });
const open = () => openRepository(repository.folder, cleanEnvironment(stoplog.everyday));
const commit = () => git('commit', '--allow-empty', '-m', 'x');

it('is the project’s scripts, and not the folder that husky makes', async () => {
  setUp();
  const { home } = await addHooks(await open());
  expect(home).toMatchObject({ folder: join(repository.folder, '.husky'), starter: 'husky', inForce: true });
  expect(await git('status', '--porcelain', '-uall')).toBe(
    '?? .husky/pre-commit\n?? .husky/pre-merge-commit\n?? .husky/pre-push\n',
  );
  await commit();
  expect(await stoplog.calls()).toMatchObject([
    { words: ['check', '--brief', '--if-touched', '--at', 'index'], cwd: repository.folder },
  ]);
  await stoplog.endWith(1);
  await expect(commit()).rejects.toThrow(/the stand-in speaks/);
});

it('runs the project’s lines first and checks what they staged, also where they end with exit 0', async () => {
  setUp();
  await repository.write('.husky/pre-commit', 'echo 9 > rain.csv\ngit add rain.csv\nexit 0\n');
  await addHooks(await open());
  await git('commit', '-m', 'x', '--allow-empty');
  const [call] = await stoplog.calls();
  expect(call?.tree).toBe((await git('rev-parse', 'HEAD^{tree}')).trim());
  expect(call?.environment).not.toHaveProperty('STOPLOG_BELOW');
  expect(await git('show', 'HEAD:rain.csv')).toBe('9\n');
});

it('holds back what the project’s lines hold back, at the first command that fails', async () => {
  setUp();
  await repository.write('.husky/pre-commit', '#!/bin/sh\nfalse\necho not reached > reached\n');
  await addHooks(await open());
  await expect(commit()).rejects.toThrow(/pre-commit script failed/);
  expect(await stoplog.calls()).toEqual([]);
  expect(await git('status', '--porcelain', 'reached')).toBe('');
});

it('gives the project’s pre-push lines the words and the input of git, and its variables', async () => {
  setUp();
  await repository.write('.husky/pre-push', 'echo "$*" > seen; cat >> seen; env >> seen\n');
  await addHooks(await open());
  const remote = await temporaryRepository({}, ['--bare']);
  await git('push', remote.folder, 'main');
  const id = (await git('rev-parse', 'HEAD')).trim();
  const seen = await readFile(join(repository.folder, 'seen'), 'utf8');
  expect(seen).toContain(
    `${remote.folder} ${remote.folder}\nrefs/heads/main ${id} refs/heads/main ${'0'.repeat(40)}\n`,
  );
  expect(seen).not.toContain('STOPLOG_BELOW');
  expect(await stoplog.calls()).toMatchObject([{ words: ['check', '--brief', '--if-touched', '--at', id] }]);
  await remote.remove();
});

it('takes no base from the project’s lines', async () => {
  setUp();
  await repository.write('.husky/pre-commit', "echo --base 'main'\n");
  await addHooks(await open());
  const { hooks } = await addHooks(await open());
  expect(hooks.map(({ base }) => base)).toEqual([null, null, null]);
  await addHooks(await open(), { base: 'origin/main' });
  expect((await listHooks(await open())).hooks.map(({ base }) => base)).toEqual(Array(3).fill('origin/main'));
});

it('starts the project’s own Stoplog', async () => {
  setUp();
  const dist = join(repository.folder, 'node_modules/stoplog/dist');
  await mkdir(dist, { recursive: true });
  await copyFile(stoplog.program, join(dist, 'stoplog.mjs'));
  const report = await addHooks(await open());
  expect(report.tool.stoplog).toBe(join(dist, 'stoplog.mjs'));
  await gitIn(
    repository.folder,
    stoplog.path(stoplog.withNode, stoplog.withTools),
  )(...['commit', '--allow-empty', '-m', 'x']);
  expect(await stoplog.calls()).toHaveLength(1);
});

it('keeps the mode of the project’s script, and gives a new one that of an ordinary file', async () => {
  setUp();
  await repository.write('.husky/pre-commit', 'true\n');
  await addHooks(await open());
  const mode = async (name: string) => (await stat(join(repository.folder, '.husky', name))).mode & 0o111;
  expect([await mode('pre-commit'), await mode('pre-push')]).toEqual([0, 0]);
});

it('is written for, and said to be asleep, where husky will be set up by npm install', async () => {
  await repository.write('.husky/pre-commit', 'true\n');
  const { home, hooks } = await addHooks(await open());
  expect(home).toMatchObject({ folder: join(repository.folder, '.husky'), starter: 'husky', inForce: false });
  expect(home.notes.join(' ')).toMatch(/husky is not set up in this work tree, so git runs no hook here/);
  expect(hooks.map((hook) => hook.done)).toEqual(['written', 'written', 'written']);
  await commit();
  expect(await stoplog.calls()).toEqual([]);
  setUp();
  await commit();
  expect(await stoplog.calls()).toHaveLength(1);
});

it('is said to be asleep in a linked work tree where it was never set up', async () => {
  setUp();
  const linked = `${repository.folder}/linked`;
  await git('worktree', 'add', '-q', linked, '-b', 'other');
  const { home } = await listHooks(await openRepository(linked, cleanEnvironment(stoplog.everyday)));
  expect(home).toMatchObject({ folder: join(linked, '.husky'), inForce: false });
});
