import { createHash, randomBytes } from 'node:crypto';
import { chmod, mkdir, mkdtemp, readdir, realpath, rm, truncate, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { outside } from '../harness/outside.ts';
import {
  cleanEnvironment,
  gitIn,
  type TemporaryRepository,
  temporaryRepository,
} from '../harness/repository.ts';
import { asTree, inSnapshot, textOf } from './in-snapshot.ts';

const head = { kind: 'revision', revision: 'HEAD' } as const;
const sha256 = (content: string) => createHash('sha256').update(content).digest('hex');

let folder: string;
let clone: string;
let source: TemporaryRepository;
const surroundings = () => ({ cwd: clone, environment: cleanEnvironment() });

beforeEach(async () => {
  folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
  clone = join(folder, 'clone');
});
afterEach(async () => {
  await source.remove();
  await rm(folder, { recursive: true });
});

describe('a partial clone', () => {
  let old: string;
  beforeEach(async () => {
    source = await temporaryRepository({ 'a.csv': 'a1\n', 'b.csv': 'b1\n' });
    old = (await source.git('rev-parse', 'HEAD:a.csv')).trim();
    await source.write('a.csv', 'a2\n');
    await source.git('commit', '--quiet', '-a', '-m', 'second');
    await source.git('config', 'uploadpack.allowFilter', 'true');
    const git = gitIn(folder);
    await git(
      'clone',
      '--quiet',
      '--no-local',
      '--filter=blob:none',
      '--no-checkout',
      `file://${source.folder}`,
      'clone',
    );
    await gitIn(clone)('reset', '--quiet');
    // One of the two files is fetched.
    await gitIn(clone)('cat-file', 'blob', 'HEAD:b.csv');
  });

  it.each([head, { kind: 'index' } as const])(
    'says what was not fetched and fetches nothing (%j)',
    async (at) => {
      const packs = await readdir(join(clone, '.git/objects/pack'));
      const state = await inSnapshot(surroundings(), at, async (snapshot) => ({
        a: await textOf(snapshot, 'a.csv'),
        b: await textOf(snapshot, 'b.csv'),
        identity: (await snapshot.identify(['b.csv', 'a.csv'])).get('a.csv'),
        old: await snapshot.readBlob(old),
        stream: await snapshot
          .stream('a.csv')
          [Symbol.asyncIterator]()
          .next()
          .catch((failure: Error) => failure.message),
      }));
      const blob = (await source.git('rev-parse', 'HEAD:a.csv')).trim();
      expect(state).toEqual({
        a: 'not-fetched',
        b: 'b1\n',
        identity: { kind: 'unavailable', why: 'not-fetched', blob },
        old: null,
        stream: expect.stringContaining('not-fetched'),
      });
      expect(await readdir(join(clone, '.git/objects/pack'))).toEqual(packs);
    },
  );
});

describe('a clone without older trees', () => {
  it('knows nothing of before', async () => {
    source = await temporaryRepository({ 'a.csv': 'a1\n' });
    await source.write('a.csv', 'a2\n');
    await source.git('commit', '--quiet', '-a', '-m', 'second');
    await source.git('config', 'uploadpack.allowFilter', 'true');
    await gitIn(folder)(
      'clone',
      '--quiet',
      '--no-local',
      '--filter=tree:0',
      `file://${source.folder}`,
      'clone',
    );
    expect(
      await inSnapshot(surroundings(), head, async (snapshot) => [
        await textOf(snapshot, 'a.csv'),
        await snapshot.readBefore('a.csv'),
      ]),
    ).toEqual(['a2\n', null]);
  });
});

describe('a shallow clone', () => {
  it('has the newest state and says that older ones are not there', async () => {
    source = await temporaryRepository({ 'a.csv': 'a1\n' });
    const [first, old] = (await source.git('rev-parse', 'HEAD', 'HEAD:a.csv')).trim().split('\n');
    await source.write('a.csv', 'a2\n');
    await source.git('commit', '--quiet', '-a', '-m', 'second');
    await gitIn(folder)('clone', '--quiet', '--depth', '1', `file://${source.folder}`, 'clone');
    const state = await inSnapshot(surroundings(), head, async (snapshot) => ({
      now: await textOf(snapshot, 'a.csv'),
      before: await snapshot.readBefore('a.csv'),
      old: await snapshot.readBlob(old ?? ''),
    }));
    expect(state).toEqual({ now: 'a2\n', before: null, old: null });
    await expect(
      inSnapshot(surroundings(), { kind: 'revision', revision: first ?? '' }, asTree),
    ).rejects.toMatchObject({
      code: 'unknown-revision',
      next: expect.stringContaining('--unshallow'),
    });
    const full = { cwd: source.folder, environment: source.environment };
    const before = await inSnapshot(full, head, (snapshot) => snapshot.readBefore('a.csv'));
    expect(String(Buffer.from(before ?? []))).toBe('a1\n');
  });
});

describe('other repositories', () => {
  it('a bare one is read by revision, and has no work tree or index', async () => {
    source = await temporaryRepository({ 'a.csv': 'a1\n' });
    await gitIn(folder)('clone', '--quiet', '--bare', source.folder, 'clone');
    expect(await inSnapshot(surroundings(), head, (snapshot) => textOf(snapshot, 'a.csv'))).toBe('a1\n');
    for (const kind of ['worktree', 'index'] as const) {
      await expect(inSnapshot(surroundings(), { kind }, asTree)).rejects.toMatchObject({
        code: 'usage',
        next: expect.stringContaining('--at HEAD'),
      });
    }
  });

  it('one with SHA-256 object ids is read like any other', async () => {
    source = await temporaryRepository({ 'a.csv': 'a1\n', 'empty.csv': '' }, ['--object-format=sha256']);
    await source.write('new.csv', 'new\n');
    await source.git('add', '--intent-to-add', 'new.csv');
    await source.write('a.csv', 'a2\n');
    const there = { cwd: source.folder, environment: source.environment };
    const blob = (await source.git('rev-parse', 'HEAD:a.csv')).trim();
    expect(blob).toHaveLength(64);
    await inSnapshot(there, { kind: 'index' }, async (snapshot) => {
      expect(snapshot.intentToAdd).toEqual(['new.csv']);
      expect((await snapshot.identify(['a.csv'])).get('a.csv')).toEqual({
        kind: 'file',
        sha256: sha256('a1\n'),
        bytes: 3,
        blob,
      });
      expect(await snapshot.readBlob(blob)).toHaveLength(3);
      expect(await snapshot.readBlob(blob.slice(0, 40))).toBeNull();
    });
    expect(await inSnapshot(there, { kind: 'worktree' }, (snapshot) => textOf(snapshot, 'a.csv'))).toBe(
      'a2\n',
    );
  });

  it('one whose folder has a colon, a quote and a blank in its name stores its work tree like any other', async () => {
    source = await temporaryRepository({ 'a.csv': 'a1\n' });
    clone = join(folder, 'it is: "odd" \\ here');
    await gitIn(folder)('clone', '--quiet', source.folder, clone);
    await writeFile(join(clone, 'a.csv'), 'a2\n');
    const state = await inSnapshot(surroundings(), { kind: 'worktree' }, async (snapshot) => [
      await textOf(snapshot, 'a.csv'),
      String(Buffer.from((await snapshot.readBefore('a.csv')) ?? [])),
    ]);
    expect(state).toEqual(['a2\n', 'a1\n']);
  });

  it('one that borrows its objects from another is read through', async () => {
    source = await temporaryRepository({ 'a.csv': 'a1\n' });
    await gitIn(folder)('clone', '--quiet', '--shared', source.folder, 'clone');
    for (const at of [head, { kind: 'worktree' } as const]) {
      expect(await inSnapshot(surroundings(), at, (snapshot) => textOf(snapshot, 'a.csv'))).toBe('a1\n');
    }
  });

  it('a blob that is lost from a whole clone is said and not passed', async () => {
    source = await temporaryRepository({ 'a.csv': 'a1\n', 'b.csv': 'b1\n' });
    const blob = (await source.git('rev-parse', 'HEAD:a.csv')).trim();
    await rm(join(source.folder, '.git/objects', blob.slice(0, 2), blob.slice(2)));
    const there = { cwd: source.folder, environment: source.environment };
    expect(await inSnapshot(there, head, (snapshot) => textOf(snapshot, 'a.csv'))).toBe('not-fetched');
    expect(await inSnapshot(there, head, (snapshot) => textOf(snapshot, 'b.csv'))).toBe('b1\n');
  });

  it('a blob that is damaged is a failure in the words of git', async () => {
    source = await temporaryRepository({ 'a.csv': randomBytes(200_000), 'b.csv': 'b1\n' });
    const blob = (await source.git('rev-parse', 'HEAD:a.csv')).trim();
    const file = join(source.folder, '.git/objects', blob.slice(0, 2), blob.slice(2));
    await chmod(file, 0o644);
    await truncate(file, 100_000);
    const there = { cwd: source.folder, environment: source.environment };
    await inSnapshot(there, head, async (snapshot) => {
      const failure = {
        code: 'git-failed',
        message: expect.stringContaining('git cat-file'),
        next: expect.stringContaining('git fsck'),
      };
      await expect(snapshot.identify(['a.csv'])).rejects.toMatchObject(failure);
      await expect(snapshot.read('a.csv')).rejects.toMatchObject(failure);
      expect(await textOf(snapshot, 'b.csv')).toBe('b1\n');
    });
  });
});

const lfs = outside('git-lfs', ['version']);
describe.skipIf(!lfs.available)(`with Git LFS ${lfs.reason}`, () => {
  const content = 'radar\n'.repeat(1000);
  const pointer = { kind: 'pointer', sha256: sha256(content), bytes: content.length };
  const identityOf = (cwd: string, at: typeof head | { kind: 'worktree' }, path = 'radar.nc') =>
    inSnapshot({ cwd, environment: cleanEnvironment() }, at, async (snapshot) => ({
      identity: (await snapshot.identify([path])).get(path),
      text: await textOf(snapshot, path),
    }));

  beforeEach(async () => {
    source = await temporaryRepository();
    await source.git('lfs', 'install', '--local', '--skip-repo');
    await source.write('.gitattributes', '*.nc filter=lfs diff=lfs merge=lfs -text\n');
    await source.write('radar.nc', content);
    await source.git('add', '.');
    await source.git('commit', '--quiet', '-m', 'radar');
  });

  it('a pointer stands for the content that it names, read where it is here', async () => {
    expect(await source.git('show', 'HEAD:radar.nc')).toContain(`oid sha256:${sha256(content)}`);
    for (const at of [head, { kind: 'worktree' } as const]) {
      expect(await identityOf(source.folder, at)).toMatchObject({
        identity: { ...pointer, present: true },
        text: content,
      });
    }
  });

  it('an edit in the work tree is stored as Git LFS would', async () => {
    await source.write('radar.nc', 'new\n');
    expect(await identityOf(source.folder, { kind: 'worktree' })).toMatchObject({
      identity: { kind: 'pointer', sha256: sha256('new\n'), bytes: 4 },
    });
    expect(await source.git('diff', '--cached')).toBe('');
  });

  it('content that was not fetched is not present, and content of another size is not it', async () => {
    await gitIn(folder, { GIT_LFS_SKIP_SMUDGE: '1' })('clone', '--quiet', source.folder, 'clone');
    const absent = { identity: { ...pointer, present: false }, text: 'no content' };
    expect(await identityOf(clone, head)).toMatchObject(absent);
    const stored = join(
      source.folder,
      '.git/lfs/objects',
      pointer.sha256.slice(0, 2),
      pointer.sha256.slice(2, 4),
      pointer.sha256,
    );
    await chmod(stored, 0o644);
    await truncate(stored, 10);
    expect(await identityOf(source.folder, head)).toMatchObject(absent);
  });

  it('content of a linked work tree is found in the common git directory', async () => {
    await source.git('worktree', 'add', '--quiet', '--detach', clone);
    expect(await identityOf(clone, head)).toMatchObject({
      identity: { ...pointer, present: true },
      text: content,
    });
  });

  it('what an extension changed is not taken for what a checkout gives', async () => {
    const oid = sha256('packed\n');
    await source.git('config', '--local', '--remove-section', 'filter.lfs');
    await source.write(
      'packed.nc',
      `version https://git-lfs.github.com/spec/v1\next-0-pack sha256:${sha256('plain')}\noid sha256:${oid}\nsize 7\n`,
    );
    await source.git('add', 'packed.nc');
    await source.git('commit', '--quiet', '-m', 'packed');
    const place = join(source.folder, '.git/lfs/objects', oid.slice(0, 2), oid.slice(2, 4));
    await mkdir(place, { recursive: true });
    await writeFile(join(place, oid), 'packed\n');
    for (let round = 0; round < 2; round += 1) {
      expect(await identityOf(source.folder, head, 'packed.nc')).toMatchObject({
        identity: { kind: 'pointer', sha256: oid, present: false },
        text: 'no content',
      });
    }
  });
});
