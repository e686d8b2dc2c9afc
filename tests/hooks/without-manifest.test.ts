import { join } from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { stoplog } from '../harness/command.ts';
import { type Installed, installed } from '../harness/installed.ts';
import { gitIn } from '../harness/repository.ts';
import { type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
let tools: Installed;

// A repository that was there before its first manifest: `main` has one, `old` and the tag `v0` have none.
beforeEach(async () => {
  project = await soundRepository();
  tools = await installed();
  await gitIn(tools.folder)('init', '--quiet', '--bare', 'server.git');
  await project.git('checkout', '--quiet', '--orphan', 'old');
  await project.git('rm', '--quiet', '--cached', '-r', '.');
  await project.git('add', 'data');
  await project.git('commit', '--quiet', '-m', 'Before there were records');
  await project.git('tag', '-a', '-m', 'First delivery', 'v0');
  await project.git('clean', '--quiet', '--force', '-d');
  expect(await stoplog(project.folder, ['hook', 'add'])).toMatchObject({ status: 0 });
});
afterEach(async () => {
  await project.remove();
  await tools.remove();
});

const git = (...words: readonly string[]) => tools.git(project.folder, ...words);

it('a branch and a tag from before the first manifest are pushed, and one line says why', async () => {
  const pushed = await git('push', join(tools.folder, 'server.git'), 'old', 'v0');
  const id = (await project.git('rev-parse', '--short=7', 'old')).trim();
  expect(pushed.words).toContain(`stoplog   ${id} holds no manifest, so there is nothing to check\n`);
  expect(pushed.done).toBe(true);
});

it('a commit there passes too', async () => {
  const committed = await git('commit', '--allow-empty', '-m', 'Late');
  expect(committed.words).toContain(
    'stoplog   what is staged for commit holds no manifest, so there is nothing to check\n',
  );
  expect(committed.done).toBe(true);
});

it('a commit that leaves the manifest out, or takes it away, is held', async () => {
  await project.git('checkout', 'main', '--', 'stoplog.yaml');
  await project.git('rm', '--quiet', '--cached', 'stoplog.yaml');
  expect(await git('commit', '--allow-empty', '-m', 'Begun')).toMatchObject({
    done: false,
    words: expect.stringContaining('Stage it first: git add'),
  });
  await project.git('checkout', '--quiet', '--force', 'main');
  await project.git('rm', '--quiet', 'stoplog.yaml');
  expect(await git('commit', '-m', 'Nobody needs it')).toMatchObject({
    done: false,
    words: expect.stringContaining('There is no stoplog.yaml'),
  });
});
