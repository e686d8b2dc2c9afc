import { execFile } from 'node:child_process';
import { mkdtemp, readFile, realpath, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { cleanEnvironment, gitIn, type TemporaryRepository } from '../harness/repository.ts';
import { awkwardRepository } from './awkward.ts';

const run = promisify(execFile);
let folder: string;
let repository: TemporaryRepository;
beforeAll(async () => {
  folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
  repository = await awkwardRepository();
  // Half past two in the night in which clocks of central Europe jump from two to three (31 March 2019).
  const git = gitIn(repository.folder, { GIT_COMMITTER_DATE: '2019-03-31T02:30:01Z' });
  await git('commit', '--quiet', '--amend', '--no-edit');
});
afterAll(async () => {
  await rm(folder, { recursive: true });
  await repository.remove();
});

/** The bytes of a package that the bundled command makes in these surroundings. */
async function made(name: string, surroundings: NodeJS.ProcessEnv): Promise<Buffer> {
  const out = join(folder, `${Object.values(surroundings).join('-').replaceAll('/', '-')}-${name}`);
  const env = cleanEnvironment(surroundings);
  const words = [resolve('dist/stoplog.mjs'), 'dossier', '--bag', '--at', 'HEAD', '--out', out];
  await run(process.execPath, words, { cwd: repository.folder, env });
  return readFile(out);
}

it.each(['bag.zip', 'bag.tar.gz'])('%s has the same bytes in every time zone and language', async (name) => {
  const here = await made(name, { TZ: 'UTC', LC_ALL: 'C' });
  expect(here.length).toBeGreaterThan(1000);
  for (const surroundings of [
    { TZ: 'Europe/Berlin', LC_ALL: 'de_DE.UTF-8' },
    { TZ: 'Pacific/Kiritimati', LC_ALL: 'tr_TR.UTF-8', SOURCE_DATE_EPOCH: '4000000000' },
    { TZ: 'America/St_Johns', LC_ALL: 'C.UTF-8', LANG: 'ja_JP.UTF-8' },
  ]) {
    expect((await made(name, surroundings)).equals(here)).toBe(true);
  }
});

it('names nobody of the machine that packed it', async () => {
  const { stdout } = await run('tar', [
    '--list',
    '--verbose',
    '--utc',
    '--full-time',
    '--file',
    join(folder, 'UTC-C-bag.tar.gz'),
  ]);
  const lines = stdout.trimEnd().split('\n');
  expect(lines.length).toBeGreaterThan(15);
  expect(lines.filter((line) => !/^-rw[-x]r-[-x]r-[-x] 0\/0 +\d+ 2019-03-31 02:30:01 /.test(line))).toEqual(
    [],
  );
});
