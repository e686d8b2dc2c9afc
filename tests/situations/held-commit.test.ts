import { execFile } from 'node:child_process';
import { mkdir, mkdtemp, rm, symlink } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { delimiter, join, resolve } from 'node:path';
import { promisify } from 'node:util';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { cleanEnvironment } from '../harness/repository.ts';
import { moreRain, type SoundRepository, soundRepository, workingIn } from '../harness/sound-repository.ts';

const run = promisify(execFile);
let project: SoundRepository;
let tools: string;

// The bundle as a person has it on PATH after a global installation.
beforeEach(async () => {
  project = await soundRepository();
  tools = await mkdtemp(join(tmpdir(), 'stoplog-tools-'));
  await symlink(resolve('dist/stoplog.mjs'), join(tools, 'stoplog'));
  await run(join(tools, 'stoplog'), ['hook', 'add'], { cwd: project.folder, env: cleanEnvironment() });
});
afterEach(async () => {
  await project.remove();
  await rm(tools, { recursive: true });
});

interface Outcome {
  readonly committed: boolean;
  readonly words: string;
}

/** `git commit` as typed in a shell, hooks and all. */
async function commit(folder: string, ...words: readonly string[]): Promise<Outcome> {
  const env = cleanEnvironment({ PATH: `${tools}${delimiter}${process.env.PATH}` });
  const told = await run('git', ['commit', '--message', 'Work', ...words], { cwd: folder, env }).then(
    ({ stdout, stderr }) => ({ committed: true, words: stdout + stderr }),
    (error: { stdout: string; stderr: string }) => ({ committed: false, words: error.stdout + error.stderr }),
  );
  return told;
}

const held = /BLOCKED[\s\S]*inputs\.rainfall {3}stale[\s\S]*1 of 3 287 values differ/;

/** A fault is staged, and the work tree is put back to what is sound. */
async function stageFault({ edit, git, read, write }: SoundRepository): Promise<void> {
  const sound = await read('data/rain.csv');
  await edit('data/rain.csv', moreRain('2005-01-01'));
  await git('add', 'data/rain.csv');
  await write('data/rain.csv', sound);
}

describe('the hook holds back what a commit would store', () => {
  it('a staged fault with a clean work tree is held', async () => {
    await stageFault(project);
    const { committed, words } = await commit(project.folder);
    expect(committed).toBe(false);
    expect(words).toMatch(held);
  });

  it('a fault in the work tree alone passes', async () => {
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.git('add', 'notes.txt');
    const { committed, words } = await commit(project.folder);
    expect(words).toContain('PASS');
    expect(committed).toBe(true);
  });

  it('commit -a is judged by what it adds', async () => {
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    expect(await commit(project.folder, '--all')).toMatchObject({
      committed: false,
      words: expect.stringMatching(held),
    });

    await project.git('checkout', '--quiet', 'HEAD', '--', 'data/rain.csv');
    await stageFault(project);
    await project.edit('model/model.mjs', (text) => `${text}\n`);
    const { committed, words } = await commit(project.folder, '--all');
    expect(committed).toBe(false);
    expect(words).toMatch(/^ {2}model {3}stale/m);
    expect(words).not.toMatch(/^ {2}inputs\.rainfall {3}stale/m);
  });

  it('commit PATH is judged by the path alone', async () => {
    await stageFault(project);
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.git('add', '--intent-to-add', 'notes.txt');
    const passed = await commit(project.folder, 'notes.txt');
    expect(passed.words).toContain('PASS');
    expect(passed.committed).toBe(true);

    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    expect(await commit(project.folder, 'data/rain.csv')).toMatchObject({
      committed: false,
      words: expect.stringMatching(held),
    });
  });

  it('in a linked work tree the tree linked there is judged', async () => {
    const folder = join(tools, 'linked');
    await mkdir(folder);
    await project.git('worktree', 'add', '--quiet', '-b', 'other', folder);
    const linked = workingIn(folder);
    await stageFault(linked);
    expect(await commit(folder)).toMatchObject({ committed: false, words: expect.stringMatching(held) });
    await linked.git('reset', '--quiet', '--hard');
    await linked.write('notes.txt', 'Gauge visited.\n');
    await linked.git('add', 'notes.txt');
    expect((await commit(folder)).committed).toBe(true);
  });

  it('nothing is committed where Stoplog is gone, and it says how to install it', async () => {
    await rm(join(tools, 'stoplog'));
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.git('add', 'notes.txt');
    const { committed, words } = await commit(project.folder);
    expect(committed).toBe(false);
    expect(words).toContain('npm install');
  });
});
