import { mkdtemp, rm, symlink } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { type TemporaryRepository, temporaryRepository } from '../../tests/harness/repository.ts';
import { onDisk } from './on-disk.ts';

let repository: TemporaryRepository;
let elsewhere: string;
beforeAll(async () => {
  repository = await temporaryRepository({ '.gitignore': 'big/\n', 'data/rain.csv': '1\n' });
  await repository.write('big/radar.csv', '2\n');
  await repository.write('big/.hidden.csv', '3\n');
  await repository.write('node_modules/x/y.csv', '4\n');
  await repository.write('.git/z.csv', '5\n');
  elsewhere = await mkdtemp(join(tmpdir(), 'stoplog-test-'));
  await symlink(elsewhere, join(repository.folder, 'out'));
  await symlink(repository.folder, join(elsewhere, 'in'));
  await symlink(join(elsewhere, 'gone.csv'), join(repository.folder, 'dangling.csv'));
});
afterAll(async () => {
  await repository.remove();
  await rm(elsewhere, { recursive: true });
});

it.each([
  ['**/*.csv', ['big/.hidden.csv', 'big/radar.csv', 'data/rain.csv']],
  ['big/*.csv', ['big/.hidden.csv', 'big/radar.csv']],
  ['data/rain.csv', ['data/rain.csv']],
  ['big', []],
  ['../*', []],
  ['data/../../*', []],
  ['/etc/*', []],
  ['out/*', []],
])('%s names %j', async (pattern, found) => {
  expect(await onDisk(repository.folder, pattern)).toEqual(found);
});
