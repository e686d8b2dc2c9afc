import { type ChildProcess, execFile, execFileSync, spawn } from 'node:child_process';
import { mkdir, mkdtemp, readdir, realpath, rm, symlink, writeFile } from 'node:fs/promises';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { delimiter, join, resolve } from 'node:path';
import { setTimeout } from 'node:timers/promises';
import { pathToFileURL } from 'node:url';
import { promisify } from 'node:util';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { stoplog } from '../harness/command.ts';
import { cleanEnvironment, gitIn } from '../harness/repository.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

const run = promisify(execFile);

/** Holds the program for PATH, the temporary folders of hooks, and the repositories that are pushed to. */
let place: string;
let project: SoundRepository;
let server: string;

beforeAll(async () => {
  place = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-server-')));
  for (const folder of ['tools', 'temporary', 'served']) await mkdir(join(place, folder));
  await symlink(resolve('dist/stoplog.mjs'), join(place, 'tools/stoplog'));
});
afterAll(() => rm(place, { recursive: true }));

beforeEach(async () => {
  project = await soundRepository();
});
afterEach(async () => {
  await project.remove();
  await rm(server, { recursive: true });
});

const surroundings = () =>
  cleanEnvironment({
    PATH: `${join(place, 'tools')}${delimiter}${process.env.PATH}`,
    TMPDIR: join(place, 'temporary'),
  });

/** A bare repository that holds what the project holds, and checks what is pushed to it. */
async function serve(...clone: string[]): Promise<void> {
  server = join(place, 'served/model.git');
  if (clone.length === 0) await project.git('clone', '--quiet', '--bare', project.folder, server);
  else await project.git(...clone, server);
  const added = await stoplog(server, ['hook', 'add', '--for', 'pre-receive']);
  expect(added).toMatchObject({ status: 0, failure: null });
}

interface Pushed {
  readonly accepted: boolean;
  readonly words: string;
}

async function push(...words: readonly string[]): Promise<Pushed> {
  return pushTo(pathToFileURL(server).href, ...words);
}

async function pushTo(url: string, ...words: readonly string[]): Promise<Pushed> {
  return run('git', ['push', url, ...words], { cwd: project.folder, env: surroundings() }).then(
    ({ stderr }) => ({ accepted: true, words: stderr }),
    ({ stderr }: { stderr: string }) => ({ accepted: false, words: stderr }),
  );
}

/** References, objects and every file but the disposable memory; and what hooks left in their temporary folder. */
async function stateOfServer(): Promise<unknown> {
  const git = gitIn(server);
  const files = await readdir(server, { recursive: true });
  return {
    references: await git('for-each-ref'),
    objects: await git('cat-file', '--batch-all-objects', '--batch-check'),
    files: files.filter((path) => path.split('/')[0] !== 'stoplog').sort(),
    temporary: await readdir(join(place, 'temporary')),
  };
}

async function commitFault(): Promise<void> {
  await project.edit('data/check.csv', moreRain('2005-01-01'));
  await project.commit('A fault');
}

async function commitNote(): Promise<void> {
  await project.write('notes.txt', 'Gauge visited.\n');
  await project.commit('A note');
}

const faulty = /BLOCKED[\s\S]*inputs\.check-gauge {3}stale[\s\S]*1 of 3 287 values differ/;

describe('a push over file://', () => {
  it('is refused with the text of a check and leaves nothing; put right, it is accepted', async () => {
    await serve();
    await commitFault();
    const before = await stateOfServer();
    const refused = await push('main');
    expect(refused.words).toMatch(faulty);
    expect(refused.words).toContain('pre-receive hook declined');
    expect(refused.accepted).toBe(false);
    expect(await stateOfServer()).toEqual(before);
    expect(before).toMatchObject({ temporary: [] });

    await project.git('revert', '--no-edit', 'HEAD');
    await commitNote();
    const accepted = await push('main');
    expect(accepted.words).toContain('PASS');
    expect(accepted.accepted).toBe(true);
    expect(await gitIn(server)('rev-parse', 'main')).toBe(await project.git('rev-parse', 'main'));
  });

  it('is refused whole when one of several references is at fault', async () => {
    await serve();
    await commitNote();
    await project.git('branch', 'sound');
    await commitFault();
    const before = await stateOfServer();
    expect(await push('sound', 'main:side')).toMatchObject({
      accepted: false,
      words: expect.stringMatching(faulty),
    });
    expect(await stateOfServer()).toEqual(before);
    expect((await push('sound', 'sound:also')).accepted).toBe(true);
  });

  it('follows tags, lets deletions pass, and judges a force push from where the histories part', async () => {
    await serve();
    const start = (await project.git('rev-parse', 'HEAD')).trim();
    await project.git('tag', '-a', '-m', 'note', 'v0');
    await commitFault();
    await project.git('tag', '-a', '-m', 'note', 'v1');
    await project.git('tag', 'note', 'HEAD:stoplog.yaml');
    await project.git('tag', '-a', '-m', 'note', 'tree', 'HEAD^{tree}');
    expect(await push('v1')).toMatchObject({ accepted: false, words: expect.stringMatching(faulty) });
    // A commit that was here already, and what is no commit: nothing to check, and nothing to say.
    const silent = await push('v0', 'note', 'tree');
    expect(silent.words).not.toContain('remote:');
    expect(silent.accepted).toBe(true);
    expect((await push(':refs/tags/note')).accepted).toBe(true);

    await project.git('reset', '--quiet', '--hard', start);
    await commitNote();
    expect((await push('main:side')).accepted).toBe(true);
    await project.git('reset', '--quiet', '--hard', start);
    await commitFault();
    expect((await push('--force', 'main:side')).words).toMatch(faulty);
    expect((await push('--force', `${start}:side`)).accepted).toBe(true);
    expect(await gitIn(server)('rev-parse', 'side')).toBe(`${start}\n`);
  });

  it('first meets the hook that was there before, with the same input and objects', async () => {
    server = join(place, 'served/model.git');
    await project.git('clone', '--quiet', '--bare', project.folder, server);
    const hook =
      '#!/bin/sh\ninput=$(cat)\necho "$input"\nset -- $input\ngit cat-file -t "$2"\n[ ! -e refuse ]\n';
    await writeFile(join(server, 'hooks/pre-receive'), hook, { mode: 0o755 });
    await stoplog(server, ['hook', 'add', '--for', 'pre-receive']);
    const old = (await project.git('rev-parse', 'HEAD')).trim();
    await commitNote();
    await project.git('tag', 'delivered');
    await writeFile(join(server, 'refuse'), '');
    const before = await stateOfServer();
    const refused = await push('main', 'delivered');
    const now = (await project.git('rev-parse', 'HEAD')).trim();
    expect(refused.words).toMatch(
      new RegExp(
        `remote: ${old} ${now} refs/heads/main *\nremote: 0{40} ${now} refs/tags/delivered *\nremote: commit`,
      ),
    );
    expect(refused.words).not.toContain('PASS');
    expect(await stateOfServer()).toEqual(before);
    await rm(join(server, 'refuse'));
    expect(await push('main', 'delivered')).toMatchObject({
      accepted: true,
      words: expect.stringMatching(/refs\/heads\/main[\s\S]*PASS/),
    });
  });

  it('into an empty repository is checked whole', async () => {
    await serve('init', '--quiet', '--bare', '--initial-branch=main');
    await commitFault();
    expect(await push('main')).toMatchObject({ accepted: false, words: expect.stringMatching(faulty) });
    expect(await push('HEAD~1:refs/heads/main')).toMatchObject({
      accepted: true,
      words: expect.stringContaining('PASS'),
    });
  });

  it('to a repository with a past is held to what it brings, on a new branch too', async () => {
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    await project.commit('What was always there');
    await serve();
    await commitNote();
    const old = await push('main:fresh', 'main');
    expect(old.words).toMatch(/PASS .*; [1-9]\d* standing, 0 cured/);
    expect(old.accepted).toBe(true);
    await commitFault();
    expect(await push('main')).toMatchObject({ accepted: false, words: expect.stringMatching(faulty) });
  });
});

describe('a push that touches no model', () => {
  beforeEach(async () => {
    const names = (await project.git('ls-tree', '--name-only', 'HEAD')).trim().split('\n');
    await mkdir(join(project.folder, 'models/harrow'), { recursive: true });
    await project.git('mv', ...names, 'models/harrow');
    await project.commit('One model of several');
    await serve();
  });

  it('passes at once', async () => {
    await commitNote();
    const { accepted, words } = await push('main');
    expect(words).toContain('nothing that a manifest governs differs between');
    expect(words).not.toContain('PASS');
    expect(accepted).toBe(true);
    await project.git('checkout', '--quiet', '--orphan', 'pages');
    await project.git('rm', '--quiet', '-r', '--cached', 'models');
    await project.git('commit', '--quiet', '-m', 'Pages');
    // A new history of its own holds no model; put in the place of one that does, it takes the model away.
    expect(await push('--force', 'pages:main')).toMatchObject({
      accepted: false,
      words: expect.stringContaining('There is no stoplog.yaml'),
    });
    expect(await push('pages')).toMatchObject({
      accepted: true,
      words: expect.stringContaining('holds no manifest'),
    });
  });

  it('is refused where it takes the manifest away', async () => {
    await project.git('rm', '--quiet', 'models/harrow/stoplog.yaml');
    await project.git('commit', '--quiet', '-m', 'Nobody needs it');
    const { accepted, words } = await push('main');
    expect(words).toContain('There is no stoplog.yaml');
    expect(accepted).toBe(false);
  });
});

describe('a push through git daemon on this machine', () => {
  let daemon: ChildProcess;
  let url: string;
  beforeAll(async () => {
    const port = await freePort();
    const program = join(execFileSync('git', ['--exec-path'], { encoding: 'utf8' }).trim(), 'git-daemon');
    const words = ['--export-all', '--enable=receive-pack', '--listen=127.0.0.1', `--port=${port}`];
    daemon = spawn(program, [...words, `--base-path=${join(place, 'served')}`], {
      env: surroundings(),
      stdio: 'ignore',
      timeout: 600_000,
    });
    url = `git://127.0.0.1:${port}/model.git`;
  });
  afterAll(() => void daemon.kill());

  it('is refused and accepted as over file://', async () => {
    await serve();
    await answering();
    await commitFault();
    const before = await stateOfServer();
    expect(await pushTo(url, 'main')).toMatchObject({
      accepted: false,
      words: expect.stringMatching(/remote: BLOCKED[\s\S]*remote: {3}inputs\.check-gauge {3}stale/),
    });
    expect(await stateOfServer()).toEqual(before);
    await project.git('revert', '--no-edit', 'HEAD');
    expect((await pushTo(url, 'main')).accepted).toBe(true);
    expect(await gitIn(server)('rev-parse', 'main')).toBe(await project.git('rev-parse', 'main'));
  });

  /** Until the daemon listens. */
  async function answering(): Promise<void> {
    for (let tries = 0; tries < 100; tries += 1) {
      const answered = await run('git', ['ls-remote', url], { env: surroundings() }).then(
        () => true,
        () => false,
      );
      if (answered) return;
      await setTimeout(100);
    }
    throw new Error('git daemon did not answer');
  }
});

async function freePort(): Promise<number> {
  const listener = createServer();
  await new Promise<void>((listening) => listener.listen(0, '127.0.0.1', listening));
  const address = listener.address();
  await new Promise((closed) => listener.close(closed));
  if (address === null || typeof address === 'string') throw new Error('no port was given');
  return address.port;
}
