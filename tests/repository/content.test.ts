import { execFileSync } from 'node:child_process';
import { createHash, randomBytes } from 'node:crypto';
import { readFile, stat, symlink, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type { SnapshotOptions } from '../../src/repository/open-snapshot.ts';
import type { Snapshot } from '../../src/repository/snapshot.ts';
import { outside } from '../harness/outside.ts';
import { type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';
import { inSnapshot, textOf } from './in-snapshot.ts';

const head = { kind: 'revision', revision: 'HEAD' } as const;
const index = { kind: 'index' } as const;

let repository: TemporaryRepository;
const removeAfterEach = () => afterEach(() => repository.remove());

const open = <Answer>(use: (snapshot: Snapshot) => Answer | Promise<Answer>, options?: SnapshotOptions) =>
  inSnapshot({ cwd: repository.folder, environment: repository.environment }, head, use, options);

const sha256 = (content: string | Uint8Array) => createHash('sha256').update(content).digest('hex');

async function collect(chunks: AsyncIterable<Uint8Array>): Promise<Buffer> {
  const all: Buffer[] = [];
  for await (const chunk of chunks) all.push(Buffer.from(chunk));
  return Buffer.concat(all);
}

describe('digests and content', () => {
  // Above 4 MiB content is streamed from git; around 256 KiB hashing changes from one call to chunks.
  const sizes = [0, 1, 1023, 1024, 65_536, 262_144, 262_145, 4_194_304, 4_194_305, 6_000_000];
  const files = Object.fromEntries(sizes.map((size) => [`bytes-${size}.bin`, randomBytes(size)]));
  beforeAll(async () => {
    repository = await temporaryRepository(files);
  });
  afterAll(() => repository.remove());

  const tool = outside('sha256sum');
  it.skipIf(!tool.available)(`are what sha256sum says of each file ${tool.reason}`, async () => {
    const told = execFileSync('sha256sum', Object.keys(files), { cwd: repository.folder, encoding: 'utf8' });
    const lines = await open(async (snapshot) =>
      [...(await snapshot.identify(Object.keys(files)))].map(([path, identity]) =>
        identity.kind === 'file' ? `${identity.sha256}  ${path}\n` : identity.kind,
      ),
    );
    expect(lines.join('')).toBe(told);
  });

  it('are whole in one piece and as a stream', async () => {
    await open(async (snapshot) => {
      for (const [path, content] of Object.entries(files)) {
        const identity = (await snapshot.identify([path])).get(path);
        expect(identity).toMatchObject({ sha256: sha256(content), bytes: content.length });
        expect(sha256((await snapshot.read(path)) ?? 'none')).toBe(sha256(content));
        expect(sha256(await collect(snapshot.stream(path)))).toBe(sha256(content));
      }
    });
  });

  it('can be read in step from several large files, and left half read', async () => {
    const [first, second] = ['bytes-6000000.bin', 'bytes-4194305.bin'] as const;
    await open(async (snapshot) => {
      const one = snapshot.stream(first)[Symbol.asyncIterator]();
      const other = snapshot.stream(second)[Symbol.asyncIterator]();
      const read = { one: 0, other: 0 };
      for (let step = 0; step < 20; step += 1) {
        read.one += (await one.next()).value?.length ?? 0;
        read.other += (await other.next()).value?.length ?? 0;
      }
      expect(read.one).toBeGreaterThan(0);
      expect(read.other).toBeGreaterThan(0);
      expect(await snapshot.read('bytes-1.bin')).toHaveLength(1);
      for await (const chunk of snapshot.stream(first)) {
        expect(chunk.length).toBeGreaterThan(0);
        break;
      }
      expect(sha256(await collect(snapshot.stream(first)))).toBe(sha256(files[first] ?? ''));
    });
  });

  it('answer many askers at once', async () => {
    const paths = Object.keys(files).flatMap((path) => [path, path, path]);
    const read = await open((snapshot) =>
      Promise.all(paths.map(async (path) => sha256(await collect(snapshot.stream(path))))),
    );
    expect(read).toEqual(paths.map((path) => sha256(files[path] ?? '')));
  });

  it('above the limit are refused with the name, and the next question is answered', async () => {
    await open(async (snapshot) => {
      for (const path of ['bytes-1024.bin', 'bytes-6000000.bin']) {
        await expect(snapshot.read(path, 1023)).rejects.toMatchObject({
          code: 'unreadable-file',
          message: expect.stringContaining(path),
        });
        expect(await snapshot.read('bytes-1023.bin', 1023)).toHaveLength(1023);
      }
    });
  });

  it('are found by blob id, and only by a whole one', async () => {
    const id = (await repository.git('rev-parse', 'HEAD:bytes-1023.bin')).trim();
    const commit = (await repository.git('rev-parse', 'HEAD')).trim();
    await open(async (snapshot) => {
      expect(sha256((await snapshot.readBlob(id)) ?? 'none')).toBe(sha256(files['bytes-1023.bin'] ?? ''));
      for (const none of [
        '0'.repeat(40),
        commit,
        id.slice(0, 39),
        'HEAD:bytes-1.bin',
        `${id}\nHEAD`,
        '',
        '0'.repeat(64),
      ]) {
        expect(await snapshot.readBlob(none)).toBeNull();
      }
      expect(await snapshot.readBlob(id)).toHaveLength(1023);
    });
  });
});

describe('paths', () => {
  removeAfterEach();

  it('of any spelling are listed and read', async () => {
    const names = [
      'a b.csv',
      'say "hi".csv',
      "it's.csv",
      'two\nlines.csv',
      'tab\there',
      '-dash',
      ':(glob)*',
      '*.csv',
      'Größe/Fluß.csv',
      ' ',
      '\\x41',
    ];
    repository = await temporaryRepository(Object.fromEntries(names.map((name) => [name, `in ${name}`])));
    await repository.write('*.csv', 'edited');
    for (const at of [head, index, { kind: 'worktree' } as const]) {
      await inSnapshot(
        { cwd: repository.folder, environment: repository.environment },
        at,
        async (snapshot) => {
          expect([...snapshot.entries.keys()]).toEqual([...names].sort());
          for (const name of names) {
            const edited = at.kind === 'worktree' && name === '*.csv';
            expect(await textOf(snapshot, name)).toBe(edited ? 'edited' : `in ${name}`);
          }
          expect(Buffer.from((await snapshot.readBefore('two\nlines.csv')) ?? '').length).toBe(
            at === head ? 0 : 16,
          );
        },
      );
    }
  });

  it('that are not UTF-8 have their bytes shown, and are read all the same', async () => {
    repository = await temporaryRepository({ 'a.csv': '1\n' });
    const name = Buffer.concat([
      Buffer.from(`${repository.folder}/caf`),
      Buffer.of(0xe9),
      Buffer.from('.csv'),
    ]);
    await writeFile(name, 'latin\n');
    await repository.git('add', '.');
    await repository.git('commit', '--quiet', '-m', 'latin');
    expect(
      await open(async (snapshot) => [[...snapshot.entries.keys()], await textOf(snapshot, 'caf\\xe9.csv')]),
    ).toEqual([['a.csv', 'caf\\xe9.csv'], 'latin\n']);
    await repository.write('caf\\xe9.csv', 'a trick\n');
    await repository.git('add', '.');
    await expect(
      inSnapshot({ cwd: repository.folder, environment: repository.environment }, index, () => null),
    ).rejects.toMatchObject({ code: 'unreadable-file', message: expect.stringContaining('not UTF-8') });
  });
});

describe('kinds of entries', () => {
  removeAfterEach();

  it('links are followed inside the repository only; a submodule has no content here', async () => {
    repository = await temporaryRepository({ 'data/v2/rain.csv': 'rain\n' });
    const link = (target: string, path: string) => symlink(target, join(repository.folder, path));
    await link('v2', 'data/current');
    await link('data/current/rain.csv', 'rain.csv');
    await link('../outside.csv', 'outside.csv');
    await link(join(repository.folder, 'data/v2/rain.csv'), 'absolute.csv');
    await link('data/v1/rain.csv', 'dangling.csv');
    await repository.git(
      '-c',
      'protocol.file.allow=always',
      'submodule',
      '--quiet',
      'add',
      repository.folder,
      'inner',
    );
    await link('inner/data/v2/rain.csv', 'into.csv');
    await repository.git('add', '.');
    await repository.git('commit', '--quiet', '-m', 'links');
    const blob = (await repository.git('rev-parse', 'HEAD:data/v2/rain.csv')).trim();
    const file = { kind: 'file', sha256: sha256('rain\n'), bytes: 5, blob };
    const inner = (await repository.git('rev-parse', 'HEAD:inner')).trim();
    const target = async (path: string) => (await repository.git('rev-parse', `HEAD:${path}`)).trim();
    expect(
      await open(async (snapshot) =>
        Object.fromEntries(
          await snapshot.identify([
            ...['data/v2/rain.csv', 'rain.csv', 'data/current/rain.csv', 'data/current', 'outside.csv'],
            ...['absolute.csv', 'dangling.csv', 'inner', 'into.csv', 'data', 'no.csv'],
          ]),
        ),
      ),
    ).toEqual({
      'data/v2/rain.csv': file,
      'rain.csv': file,
      'data/current/rain.csv': file,
      'data/current': { kind: 'unavailable', why: 'link-dangling', blob: await target('data/current') },
      'outside.csv': { kind: 'unavailable', why: 'link-outside', blob: await target('outside.csv') },
      'absolute.csv': { kind: 'unavailable', why: 'link-outside', blob: await target('absolute.csv') },
      'dangling.csv': { kind: 'unavailable', why: 'link-dangling', blob: await target('dangling.csv') },
      inner: { kind: 'unavailable', why: 'submodule', blob: inner },
      'into.csv': { kind: 'unavailable', why: 'submodule', blob: inner },
      data: { kind: 'unavailable', why: 'absent', blob: null },
      'no.csv': { kind: 'unavailable', why: 'absent', blob: null },
    });
  });

  it('conflicts and intents to add in the index are said', async () => {
    repository = await temporaryRepository({ 'a.csv': 'base\n', 'empty.csv': '' });
    await repository.git('checkout', '--quiet', '-b', 'other');
    await repository.write('a.csv', 'theirs\n');
    await repository.git('commit', '--quiet', '-a', '-m', 'theirs');
    await repository.git('checkout', '--quiet', 'main');
    await repository.write('a.csv', 'ours\n');
    await repository.git('commit', '--quiet', '-a', '-m', 'ours');
    await expect(repository.git('merge', 'other')).rejects.toThrow(/CONFLICT/);
    await repository.write('new.csv', 'new\n');
    await repository.git('add', '--intent-to-add', 'new.csv');
    await symlink('a.csv', join(repository.folder, 'link.csv'));
    await repository.git('add', 'link.csv');
    await inSnapshot(
      { cwd: repository.folder, environment: repository.environment },
      index,
      async (snapshot) => {
        expect([...snapshot.entries.keys()]).toEqual(['empty.csv', 'link.csv']);
        expect(snapshot.unmerged).toEqual(['a.csv']);
        expect(snapshot.intentToAdd).toEqual(['new.csv']);
        const paths = ['a.csv', 'link.csv', 'new.csv', 'empty.csv'];
        expect(await Promise.all(paths.map((path) => textOf(snapshot, path)))).toEqual([
          ...['unmerged', 'unmerged', 'intent-to-add', ''],
        ]);
      },
    );
  });

  it('a replaced object shows its true bytes', async () => {
    repository = await temporaryRepository({ 'a.csv': 'true\n', 'b.csv': 'false\n' });
    const [a, b] = (await repository.git('rev-parse', 'HEAD:a.csv', 'HEAD:b.csv')).trim().split('\n');
    await repository.git('replace', a ?? '', b ?? '');
    expect(await repository.git('show', 'HEAD:a.csv')).toBe('false\n');
    expect(await open((snapshot) => textOf(snapshot, 'a.csv'))).toBe('true\n');
  });
});

describe('the memory of digests', () => {
  removeAfterEach();

  const memoryFile = () => join(repository.folder, '.git/stoplog/digests');
  const digest = (options?: SnapshotOptions) =>
    open(async (snapshot) => {
      const identity = (await snapshot.identify(['a.csv'])).get('a.csv');
      return identity?.kind === 'file' ? identity.sha256 : identity?.kind;
    }, options);

  it('is used while it is whole, and can be left out', async () => {
    repository = await temporaryRepository({ 'a.csv': 'a1\n' });
    await digest({ remember: false });
    await expect(stat(memoryFile())).rejects.toThrow();
    expect(await digest()).toBe(sha256('a1\n'));
    // A memory that lies, with a checksum that holds, shows that the content was not hashed again.
    const text = await readFile(memoryFile(), 'latin1');
    const body = text
      .slice(0, text.lastIndexOf('\n', text.length - 2) + 1)
      .replace(sha256('a1\n'), 'f'.repeat(64));
    await writeFile(memoryFile(), `${body}${sha256(body)}\n`);
    expect(await digest()).toBe('f'.repeat(64));
    expect(await digest({ remember: false })).toBe(sha256('a1\n'));
    await writeFile(memoryFile(), `${body}${sha256(text)}\n`);
    expect(await digest()).toBe(sha256('a1\n'));
  });

  it('survives two runs at once', async () => {
    repository = await temporaryRepository({ 'a.csv': 'a1\n', 'b.csv': 'b1\n' });
    expect(await Promise.all([digest(), digest(), digest(), digest()])).toEqual(
      Array(4).fill(sha256('a1\n')),
    );
    expect(await digest()).toBe(sha256('a1\n'));
  });
});
