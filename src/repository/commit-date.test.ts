import { expect, it } from 'vitest';
import { gitIn, temporaryRepository } from '../../tests/harness/repository.ts';
import { commitDate } from './commit-date.ts';
import { ask } from './git.ts';

it('tells when the committer committed, in UTC', async () => {
  const repository = await temporaryRepository({ 'a.txt': 'a\n' });
  // RFC 2822 with an offset: 23:30 on the last day of the year at -05:00 is the next year in UTC.
  const git = gitIn(repository.folder, { GIT_COMMITTER_DATE: 'Thu, 31 Dec 2020 23:30:05 -0500' });
  await git('commit', '--quiet', '--allow-empty', '--message', 'committer Nobody <> 1 +0000');
  const commit = (await git('rev-parse', 'HEAD')).trim();
  expect(await ask({ cwd: repository.folder, environment: repository.environment }, commitDate(commit))).toBe(
    '2021-01-01T04:30:05Z',
  );
  await repository.remove();
});
