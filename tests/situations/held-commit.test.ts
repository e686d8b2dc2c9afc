import { mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { stoplog } from '../harness/command.ts';
import { type Installed, installed } from '../harness/installed.ts';
import { moreRain, type SoundRepository, soundRepository, workingIn } from '../harness/sound-repository.ts';

let project: SoundRepository;
let tools: Installed;
beforeEach(async () => {
  project = await soundRepository();
  tools = await installed();
  await stoplog(project.folder, ['hook', 'add']);
});
afterEach(async () => {
  await project.remove();
  await tools.remove();
});

const commit = (folder: string, ...words: readonly string[]) =>
  tools.git(folder, 'commit', '--message', 'Work', ...words);

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
    const { done, words } = await commit(project.folder);
    expect(done).toBe(false);
    expect(words).toMatch(held);
  });

  it('a fault in the work tree alone passes', async () => {
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.git('add', 'notes.txt');
    const { done, words } = await commit(project.folder);
    expect(words).toContain('PASS');
    expect(done).toBe(true);
  });

  it('commit -a is judged by what it adds', async () => {
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    expect(await commit(project.folder, '--all')).toMatchObject({
      done: false,
      words: expect.stringMatching(held),
    });

    await project.git('checkout', '--quiet', 'HEAD', '--', 'data/rain.csv');
    await stageFault(project);
    await project.edit('model/model.mjs', (text) => `${text}\n`);
    const { done, words } = await commit(project.folder, '--all');
    expect(done).toBe(false);
    expect(words).toMatch(/^ {2}model {3}stale/m);
    expect(words).not.toMatch(/^ {2}inputs\.rainfall {3}stale/m);
  });

  it('commit PATH is judged by the path alone', async () => {
    await stageFault(project);
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.git('add', '--intent-to-add', 'notes.txt');
    const passed = await commit(project.folder, 'notes.txt');
    expect(passed.words).toContain('PASS');
    expect(passed.done).toBe(true);

    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    expect(await commit(project.folder, 'data/rain.csv')).toMatchObject({
      done: false,
      words: expect.stringMatching(held),
    });
  });

  it('in a linked work tree the tree linked there is judged', async () => {
    const folder = join(tools.folder, 'linked');
    await mkdir(folder);
    await project.git('worktree', 'add', '--quiet', '-b', 'other', folder);
    const linked = workingIn(folder);
    await stageFault(linked);
    expect(await commit(folder)).toMatchObject({ done: false, words: expect.stringMatching(held) });
    await linked.git('reset', '--quiet', '--hard');
    await linked.write('notes.txt', 'Gauge visited.\n');
    await linked.git('add', 'notes.txt');
    expect((await commit(folder)).done).toBe(true);
  });

  it('nothing is committed where Stoplog is gone, and it says how to install it', async () => {
    await rm(join(tools.folder, 'stoplog'));
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.git('add', 'notes.txt');
    const { done, words } = await commit(project.folder);
    expect(done).toBe(false);
    expect(words).toContain('npm install');
  });
});
