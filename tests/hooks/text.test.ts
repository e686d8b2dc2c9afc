import { appendFile, chmod } from 'node:fs/promises';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, beforeEach, expect, it } from 'vitest';
import { hookAdd, hookList, hookRemove } from '../../src/commands/hook.ts';
import { cleanEnvironment, type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';
import { type StandIn, standIn } from './stand-in.ts';

let stoplog: StandIn;
let repository: TemporaryRepository;
beforeAll(async () => {
  stoplog = await standIn();
});
afterAll(() => stoplog.remove());
beforeEach(async () => {
  repository = await temporaryRepository({ 'rain.csv': '1\n' });
});
afterEach(() => repository.remove());

/** What a command says, with Node and the stand-in on PATH or without. */
async function said(
  action: typeof hookAdd,
  folders = [stoplog.withStoplog, stoplog.withNode],
): Promise<string> {
  let text = '';
  const status = await action({
    cwd: repository.folder,
    environment: cleanEnvironment(stoplog.path(...folders, stoplog.withTools)),
    today: '2026-03-02',
    color: false,
    write: (more) => {
      text += more;
    },
    tell: () => {},
    progress: () => {},
  });
  expect(status).toBe(0);
  return text;
}

it('says what was written, what runs first, and what git leaves out', async () => {
  await repository.hook('pre-commit', 'true');
  await repository.hook('pre-push', 'true');
  await chmod(join(repository.folder, '.git/hooks/pre-push'), 0o644);
  expect(await said(hookAdd)).toBe(`Hooks in .git/hooks, started by git

  pre-commit         written
                     first runs .git/hooks/pre-commit.local, the hook that was here before
  pre-merge-commit   written
  pre-push           written
                     keeps .git/hooks/pre-push.local, the hook that was here before; it is not
                     executable, so it is skipped, as git skipped it

They start ${stoplog.withStoplog}/stoplog.
git runs none of these hooks for a rebase, a cherry-pick, a revert or with --no-verify: check pull
requests too.
`);
});

it('says what is there', async () => {
  expect(await said(hookList)).toBe(`Hooks in .git/hooks, started by git

  pre-commit         none
  pre-merge-commit   none
  pre-push           none
`);
  await said(hookAdd);
  const folder = join(repository.folder, '.git/hooks');
  await repository.hook('pre-push', 'true');
  await chmod(join(folder, 'pre-push'), 0o644);
  await repository.hook('pre-merge-commit', 'true');
  await chmod(join(folder, 'pre-commit'), 0o644);
  expect(await said(hookList)).toBe(`Hooks in .git/hooks, started by git

  pre-commit         checks the records
                     not executable, so git skips it; \`stoplog hook add\` mends that
  pre-merge-commit   not Stoplog’s
  pre-push           not Stoplog’s
                     not executable, so git skips it

They start ${stoplog.withStoplog}/stoplog.
`);
});

it('says what was put back, and how to be rid of a hook that somebody changed', async () => {
  await repository.hook('pre-commit', 'true');
  await repository.hook('pre-push', 'true');
  await said(hookAdd);
  await appendFile(join(repository.folder, '.git/hooks/pre-push'), 'echo more\n');
  expect(await said(hookRemove)).toBe(`Hooks in .git/hooks, started by git

  pre-commit         taken away; what was here before is back
  pre-merge-commit   taken away
  pre-push           left as it is: someone changed it since Stoplog wrote it
                     first runs .git/hooks/pre-push.local, the hook that was here before
                     to be rid of it, keep what you need of .git/hooks/pre-push, delete it and
                     rename .git/hooks/pre-push.local to pre-push
`);
  expect(await said(hookList)).toMatch(/pre-push {11}Stoplog’s, but someone changed it since\n/);
});

it('says when there is nothing to start', async () => {
  expect(await said(hookAdd, [])).toMatch(
    /Node\.js is not on PATH: .*\nStoplog is neither in node_modules nor on/s,
  );
  const npm = join(stoplog.withStoplog, '../node_modules/.bin');
  expect(await said(hookList, [npm, stoplog.withNode])).toMatch(
    /Stoplog is neither in node_modules nor on PATH/,
  );
});

it('says where git does not look now', async () => {
  await said(hookAdd);
  await repository.git('config', 'core.hooksPath', 'hooks');
  const listed = await said(hookList);
  expect(listed).toMatch(/^Hooks in hooks, started by git\n\n {2}pre-commit {9}none\n/);
  expect(listed).toMatch(
    /\n\nHooks in \.git\/hooks, where git does not look now\n\n {2}pre-commit {9}checks the records\n/,
  );
  await repository.git('config', 'core.hooksPath', '/dev/null');
  expect(await said(hookList)).toMatch(
    /which is no folder, so git runs no hooks here\.\nGive this repository hooks/,
  );
});
