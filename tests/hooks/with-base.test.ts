import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { stoplog } from '../harness/command.ts';
import { type Installed, installed } from '../harness/installed.ts';
import { type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
let tools: Installed;

/** A value outside the range that it was searched in, as an old model may bring along. */
const parameter = (name: string, value: number) => ({
  ...{ name, unit: 'mm', change: 'set', initial: 1, value, range: [0, 5], range_from: 'report 3' },
  scope: 'whole catchment',
});

// A repository with a past: `main` has a fault of long ago, and work goes on in a branch.
beforeEach(async () => {
  project = await soundRepository();
  await project.state({ set: { 'parameters.values': [parameter('old', 9)] } });
  await project.commit('What was always there');
  await project.git('checkout', '--quiet', '-b', 'change');
  tools = await installed();
});
afterEach(async () => {
  await project.remove();
  await tools.remove();
});

const hook = (...words: string[]) => stoplog(project.folder, ['hook', ...words]);
const preCommit = () => readFile(join(project.folder, '.git/hooks/pre-commit'), 'latin1');

async function commit(...words: readonly string[]) {
  await project.git('add', '--all');
  return tools.git(project.folder, 'commit', '--message', 'Work', ...words);
}

describe('hooks with a base, in a repository with a past', () => {
  it('let an unrelated commit pass, which others would hold', async () => {
    await hook('add');
    await project.edit('stoplog.yaml', (text) => `${text}# The gauge was visited.\n`);
    expect((await commit()).done).toBe(false);
    await hook('add', '--base', 'main');
    expect(await commit()).toMatchObject({ done: true, words: expect.stringMatching(/standing/) });
  });

  it('hold a new fault, also in the commit after one that went past the hook', async () => {
    await hook('add', '--base', 'main');
    await project.state({ set: { 'parameters.values': [parameter('old', 9), parameter('new', 8)] } });
    const held = { done: false, words: expect.stringMatching(/BLOCKED[\s\S]*new/) };
    expect(await commit()).toMatchObject(held);
    expect((await commit('--no-verify')).done).toBe(true);
    expect(await commit('--allow-empty')).toMatchObject(held);
    expect(await commit('--amend')).toMatchObject(held);
  });

  it('keep their base when they are brought up to date, until another is named', async () => {
    expect((await hook('add', '--base', 'main')).text).not.toContain('names no commit');
    const added = (await hook('add', '--base', 'origin/main')).text.replace(/\s+/g, ' ');
    expect(added).toContain(
      'origin/main names no commit here yet. Until it does, the whole state is checked',
    );
    expect(await preCommit()).toContain(" --base 'origin/main' --at index\n");
    const before = await preCommit();
    expect((await hook('add')).text).toContain('holds back only what is new since origin/main');
    expect(await preCommit()).toBe(before);
    await hook('add', '--base', 'HEAD~1');
    expect((await hook('list')).text).toContain('holds back only what is new since HEAD~1');
    await hook('remove');
    await hook('add');
    expect(await preCommit()).not.toContain('--base');
  });

  it.each(["main'; echo", '--all', '', 'a b', 'a\nb', '$(id)'])('take no %j for a base', async (base) => {
    const { status, failure } = await hook('add', `--base=${base}`);
    expect(status).toBe(2);
    expect(failure?.message).toMatch(/no name of a revision/);
    await expect(preCommit()).rejects.toThrow(/ENOENT/);
  });
});
