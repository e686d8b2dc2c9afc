import { mkdir, mkdtemp, realpath, rm, symlink, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { deflateRawSync, gzipSync } from 'node:zlib';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { ordinaryLimits } from '../../src/dossier/verify/findings.ts';
import { verifyPackage } from '../../src/dossier/verify/verify-package.ts';
import { sha256 } from './awkward.ts';
import { type MadeEntry, madeTar, madeZip } from './made-archives.ts';

let folder: string;
beforeEach(async () => {
  folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
});
afterEach(() => rm(folder, { recursive: true }));

const hello = { path: 'data/hello.txt', content: 'hello\n' };
const bag: readonly Required<Pick<MadeEntry, 'path' | 'content'>>[] = [
  { path: 'bagit.txt', content: 'BagIt-Version: 1.0\nTag-File-Character-Encoding: UTF-8\n' },
  hello,
  { path: 'manifest-sha256.txt', content: `${sha256('hello\n')}  data/hello.txt\n` },
];

const verifyZip = async (entries: readonly MadeEntry[], limits = ordinaryLimits) => {
  const file = join(folder, 'package.zip');
  await writeFile(file, madeZip(entries));
  return verifyPackage(file, limits);
};
const verifyTar = async (entries: Parameters<typeof madeTar>[0], limits = ordinaryLimits) => {
  const file = join(folder, 'package.tar.gz');
  await writeFile(file, await madeTar(entries));
  return verifyPackage(file, limits);
};
const asTar = bag.map(({ path, content }) => ({ name: path, content: String(content) }));

it('the bag that the others are made of is valid in each form', async () => {
  expect(await verifyZip(bag)).toMatchObject({ status: 'valid', problems: [] });
  expect(await verifyTar(asTar)).toMatchObject({ status: 'valid', problems: [] });
});

describe('a path that leads out of the package', () => {
  it.each([
    ['../../etc/cron.d/x', /leads out/],
    ['data/../../x', /leads out/],
    ['/etc/passwd', /absolute path/],
    ['C:/Windows/x', /absolute path/],
    ['~/.ssh/authorized_keys', /home folder/],
    ['data\\..\\..\\x', /backslash/],
    ['data/./x', /no plain path/],
    ['data//x', /no plain path/],
    ['..', /leads out/],
  ])('%s is named in zip and tar', async (path, message) => {
    const problem = { kind: 'broken', file: path, message: expect.stringMatching(message) };
    const zipped = await verifyZip([...bag, { path, content: 'x' }]);
    expect(zipped.status).toBe('broken');
    expect(zipped.problems).toContainEqual(problem);
    const tarred = await verifyTar([...asTar, { name: path, content: 'x' }]);
    expect(tarred.problems).toContainEqual(problem);
  });

  it.each(['../x', '/etc/passwd', '~root/x'])('%s is named in a manifest and in fetch.txt', async (path) => {
    const manifest = `${bag[2]?.content}${sha256('x')}  ${path}\n`;
    const { problems } = await verifyZip([
      ...bag.slice(0, 2),
      { path: 'manifest-sha256.txt', content: manifest },
      { path: 'fetch.txt', content: `https://northmere.example/x 1 ${path}\n` },
    ]);
    for (const file of ['manifest-sha256.txt', 'fetch.txt']) {
      expect(problems).toContainEqual({
        kind: 'broken',
        file,
        message: expect.stringContaining(JSON.stringify(path)),
      });
    }
  });
});

describe('what is no file', () => {
  it('is a link in a zip', async () => {
    const { problems } = await verifyZip([
      ...bag,
      { path: 'data/link', content: '/etc/passwd', mode: 0o120777 },
    ]);
    expect(problems).toContainEqual(
      expect.objectContaining({ file: 'data/link', message: expect.stringMatching(/link/) }),
    );
  });

  it.each([
    ['symlink', /is a link/],
    ['link', /is a link/],
    ['character-device', /neither a file/],
    ['fifo', /neither a file/],
  ] as const)('is a %s in a tar', async (type, message) => {
    const { status, problems } = await verifyTar([
      ...asTar,
      { name: 'data/odd', type, linkname: '/etc/passwd' },
    ]);
    expect(status).toBe('broken');
    expect(problems).toContainEqual({
      kind: 'broken',
      file: 'data/odd',
      message: expect.stringMatching(message),
    });
  });

  it('is a link in a folder, to a file or to a folder that goes round', async () => {
    const top = join(folder, 'bag');
    await mkdir(join(top, 'data'), { recursive: true });
    for (const { path, content } of bag) await writeFile(join(top, path), content);
    await symlink('/etc/passwd', join(top, 'data/secret'));
    await symlink('..', join(top, 'data/round'));
    const { problems } = await verifyPackage(top);
    expect(problems.filter(({ kind }) => kind === 'broken').map(({ file }) => file)).toEqual([
      'data/round',
      'data/secret',
    ]);
  });
});

describe('names that are there twice', () => {
  it.each([
    ['the same', 'data/hello.txt', 'data/hello.txt'],
    ['in two forms of one accent', 'data/é.txt'.normalize('NFC'), 'data/é.txt'.normalize('NFD')],
  ])('%s', async (_, first, second) => {
    const { problems } = await verifyZip([
      ...bag.filter(({ path }) => path !== first),
      { path: first },
      { path: second },
    ]);
    expect(problems).toContainEqual({ kind: 'broken', file: first, message: expect.stringMatching(/twice/) });
  });
});

describe('what grows', () => {
  const zeros = new Uint8Array(8 * 1024 * 1024);
  const limits = { ...ordinaryLimits, grownBytes: 1024 * 1024 };

  it('is stopped in a zip', async () => {
    const deflated = { data: deflateRawSync(zeros), claims: zeros.length };
    const { status, problems } = await verifyZip([...bag, { path: 'data/zeros', deflated }], limits);
    expect(status).toBe('broken');
    expect(problems).toContainEqual(
      expect.objectContaining({ file: 'data/zeros', message: expect.stringMatching(/grows far beyond/) }),
    );
  });

  it('is stopped where it claims to be small', async () => {
    const deflated = { data: deflateRawSync(zeros), claims: 10 };
    const { status, problems } = await verifyZip([...bag, { path: 'data/zeros', deflated }]);
    expect(status).toBe('broken');
    expect(problems).toContainEqual(
      expect.objectContaining({
        file: expect.stringMatching(/package\.zip$/),
        message: expect.stringMatching(/to its end/),
      }),
    );
  });

  it.each(['file', 'contiguous-file'] as const)('is stopped in a tar, as a %s', async (type) => {
    const { status, problems } = await verifyTar(
      [...asTar, { name: 'data/zeros', type, content: '\0'.repeat(zeros.length) }],
      limits,
    );
    expect(status).toBe('broken');
    expect(problems).toContainEqual(
      expect.objectContaining({ message: expect.stringMatching(/grows far beyond/) }),
    );
  });

  it('is stopped by the number of its files and folders', async () => {
    const many = Array.from({ length: 20 }, (_, place) => ({ path: `data/${place}/` }));
    const { problems } = await verifyZip([...bag, ...many], { ...ordinaryLimits, entries: 10 });
    expect(problems).toContainEqual(
      expect.objectContaining({ message: expect.stringMatching(/more than 10 files and folders/) }),
    );
  });

  it('is not read as text where a manifest is huge', async () => {
    const { problems } = await verifyZip(bag, { ...ordinaryLimits, textBytes: 20 });
    expect(problems).toContainEqual(
      expect.objectContaining({
        file: 'manifest-sha256.txt',
        message: expect.stringMatching(/no UTF-8 text of ordinary size/),
      }),
    );
  });
});

it.each([
  ['cut.zip', (whole: Buffer) => whole.subarray(0, whole.length - 30)],
  ['noise.zip', () => Buffer.from('no archive')],
  ['empty.zip', () => Buffer.alloc(0)],
])('%s is told to be unreadable', async (name, change) => {
  const file = join(folder, name);
  await writeFile(file, change(madeZip(bag)));
  const { status, problems } = await verifyPackage(file);
  expect(status).toBe('broken');
  expect(problems).toContainEqual(
    expect.objectContaining({ file, message: expect.stringMatching(/to its end/) }),
  );
});

it.each([
  ['cut.tar.gz', (whole: Buffer) => whole.subarray(0, whole.length - 30)],
  ['noise.tar.gz', () => Buffer.from('no archive')],
  ['no-tar.tar.gz', () => gzipSync(Buffer.from('x'.repeat(2000)))],
])('%s is told to be unreadable', async (name, change) => {
  const file = join(folder, name);
  await writeFile(file, change(await madeTar(asTar)));
  const { status, problems } = await verifyPackage(file);
  expect(status).toBe('broken');
  expect(problems).toContainEqual(
    expect.objectContaining({ file, message: expect.stringMatching(/to its end/) }),
  );
});

describe('documents that can’t be what they seem', () => {
  it.each([
    ['not JSON', '{'],
    ['another shape', '[]'],
    ['hidden names', '{"format":"stoplog-contents/1","commit":{"toString":1}}'],
    ['deep', '['.repeat(200_000)],
  ])('a contents.json that is %s', async (_, content) => {
    const manifest = `${sha256('hello\n')}  data/hello.txt\n${sha256(content)}  data/contents.json\n`;
    const { problems } = await verifyZip([
      ...bag.slice(0, 2),
      { path: 'data/contents.json', content },
      { path: 'manifest-sha256.txt', content: manifest },
    ]);
    expect(problems).toEqual([
      { kind: 'broken', file: 'data/contents.json', message: 'is not the list of contents of a dossier' },
    ]);
  });
});

it('says where there is nothing, and what can’t be a package', async () => {
  await expect(verifyPackage(join(folder, 'none'))).rejects.toMatchObject({ code: 'unreadable-file' });
  await writeFile(join(folder, 'notes.txt'), 'x');
  await expect(verifyPackage(join(folder, 'notes.txt'))).rejects.toMatchObject({ code: 'usage' });
});
