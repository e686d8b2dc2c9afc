import { spawnSync } from 'node:child_process';
import { lstat, mkdtemp, readdir, readFile, realpath, rm, stat } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Contents } from '../../src/dossier/contents.ts';
import { stoplog } from '../harness/command.ts';
import { outside } from '../harness/outside.ts';
import { type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';
import { awkwardNames, awkwardRepository, farContent, fetchedUrl, largeContent, sha256 } from './awkward.ts';

const coreutils = outside('sha256sum');
const unzip = outside('unzip', ['-v']);

let folder: string;
let repository: TemporaryRepository;
beforeAll(async () => {
  folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
  repository = await awkwardRepository();
});
afterAll(async () => {
  await rm(folder, { recursive: true });
  await repository.remove();
});

const make = async (name: string, ...words: readonly string[]) => {
  const out = join(folder, name);
  const ran = await stoplog(repository.folder, ['dossier', '--out', out, ...words]);
  if (ran.failure !== null) throw ran.failure;
  return { ...ran, out };
};

/**
 * What RFC 8493 asks of a bag, by GNU coreutils alone: the three encoded characters are brought into the form that `sha256sum`
 * reads, the digests checked, and the list held against what is there.
 */
const byCoreutils = (bag: string, algorithm = 'sha256') =>
  spawnSync(
    'bash',
    [
      '-euc',
      `set -o pipefail
       cd "$1"
       decode='/%0[AaDd]/{s/\\\\/\\\\\\\\/g;s/^/\\\\/;s/%0[Aa]/\\\\n/g;s/%0[Dd]/\\\\r/g};s/%25/%/g'
       sed "$decode" manifest-$2.txt | $2sum --strict --quiet --check -
       $2sum --strict --quiet --check tagmanifest-$2.txt
       diff <(find data -type f -print0 | sed -z 's/%/%25/g;s/\\n/%0A/g;s/\\r/%0D/g' | tr '\\0' '\\n' | LC_ALL=C sort) \\
            <(sed -E 's/^[0-9a-f]+  //' manifest-$2.txt | LC_ALL=C sort)`,
      'bash',
      bag,
      algorithm,
    ],
    { encoding: 'utf8' },
  );

describe('a bag', () => {
  let bag: string;
  const text = (name: string) => readFile(join(bag, name), 'utf8');
  beforeAll(async () => {
    bag = (await make('bag', '--bag')).out;
  });

  it('declares itself in exactly two lines (RFC 8493, 2.1.1)', async () => {
    expect(await text('bagit.txt')).toBe('BagIt-Version: 1.0\nTag-File-Character-Encoding: UTF-8\n');
  });

  it('holds the blobs of the revision, whatever their names', async () => {
    for (const name of awkwardNames) {
      const content = await text(`data/repository/${name}`);
      expect(content).toBe(name === 'data/empty.csv' ? '' : `${name}\n`);
    }
    expect((await stat(join(bag, 'data/repository/model/run.sh'))).mode & 0o100).toBe(0o100);
    expect((await stat(join(bag, 'data/repository/data/empty.csv'))).mode & 0o111).toBe(0);
  });

  it('holds the content of Git LFS where it is here, and says where it is not', async () => {
    expect(await text('data/repository/large/here.tif')).toBe(largeContent);
    await expect(text('data/repository/large/far.tif')).rejects.toThrow(/ENOENT/);
    const { files } = JSON.parse(await text('data/contents.json')) as Contents;
    expect(files.find(({ path }) => path === 'large/far.tif')).toEqual({
      path: 'large/far.tif',
      sha256: sha256(farContent),
      bytes: farContent.length,
      lies: null,
      note: expect.stringContaining('Git LFS content was not fetched'),
    });
    expect(files.find(({ path }) => path === 'radar/drive.nc')).toMatchObject({
      lies: null,
      note: expect.stringContaining('shelf 3, box 12'),
    });
    const page = await text('data/dossier.md');
    expect(page).toMatch(/large\/far\.tif.*Git LFS content was not fetched/);
    expect(page).toMatch(/radar\/drive\.nc.*shelf 3, box 12/);
    expect(page).toMatch(/radar\/50% 2001\.nc.*to be fetched from/);
  });

  it('holds no links: what one leads to lies there as a file, and nothing from outside', async () => {
    expect((await lstat(join(bag, 'data/repository/data/link.csv'))).isFile()).toBe(true);
    expect(await text('data/repository/data/link.csv')).toBe('data/rain gauge 50%.csv\n');
    const { files } = JSON.parse(await text('data/contents.json')) as Contents;
    expect(files.find(({ path }) => path === 'data/away.csv')).toMatchObject({
      sha256: null,
      lies: null,
      note: 'it is a link that leads out of the repository',
    });
  });

  it('names what is to be fetched, with an encoded address and path (2.2.3)', async () => {
    expect(await text('fetch.txt')).toBe(`${fetchedUrl} 6 data/repository/radar/50%25 2001.nc\n`);
    expect(await text('manifest-sha256.txt')).toContain(
      `${sha256('radar\n')}  data/repository/radar/50%25 2001.nc\n`,
    );
  });

  it('has no SHA-512 of bytes that were never here (2.4)', async () => {
    expect((await readdir(bag)).sort()).toEqual([
      'bag-info.txt',
      'bagit.txt',
      'data',
      'fetch.txt',
      'manifest-sha256.txt',
      'tagmanifest-sha256.txt',
    ]);
  });

  it('counts the filled payload, and keeps every value on one line (2.2.2)', async () => {
    const names = (await text('manifest-sha256.txt')).trimEnd().split('\n');
    const sizes = spawnSync('find', ['data', '-type', 'f', '-printf', '%s\n'], {
      cwd: bag,
      encoding: 'utf8',
    });
    const bytes =
      sizes.stdout
        .trim()
        .split('\n')
        .reduce((sum, size) => sum + Number(size), 0) + 6;
    expect((await text('bag-info.txt')).replaceAll(/[0-9a-f]{40}|[0-9a-f-]{36}/g, 'ID')).toBe(
      `Bag-Software-Agent: Stoplog unbundled
Bagging-Date: ${(await repository.git('log', '-1', '--date=format-local:%Y-%m-%d', '--format=%cd')).trim()}
External-Description: An invented brook in two lines
External-Identifier: urn:uuid:ID
Internal-Sender-Identifier: git commit ID
Payload-Oxum: ${bytes}.${names.length}
`,
    );
  });

  it('awaits its fetched file, and is valid once somebody put it there', async () => {
    const awaiting = await stoplog(folder, ['dossier', '--verify', 'bag']);
    expect(awaiting.text).toContain('bag is awaiting fetch');
    expect(awaiting.text).toContain(`data/repository/radar/50% 2001.nc from ${fetchedUrl}`);
    expect(awaiting.status).toBe(1);
    spawnSync('bash', ['-c', 'mkdir -p radar && printf "radar\\n" > "radar/50% 2001.nc"'], {
      cwd: join(bag, 'data/repository'),
    });
    const { text, status } = await stoplog(folder, ['dossier', '--verify', 'bag']);
    expect(text).toContain('bag is valid');
    expect(status).toBe(0);
  });

  it.skipIf(!coreutils.available)(`is right by coreutils${coreutils.reason}`, () => {
    expect(byCoreutils(bag)).toMatchObject({ status: 0, stdout: '', stderr: '' });
  });
});

it.skipIf(!coreutils.available)(
  'without files elsewhere has both manifests, right by coreutils',
  async () => {
    const whole = await awkwardRepository(false);
    const bag = join(folder, 'whole');
    expect(await stoplog(whole.folder, ['dossier', '--bag', '--out', bag])).toMatchObject({ status: 0 });
    expect(byCoreutils(bag)).toMatchObject({ status: 0, stdout: '', stderr: '' });
    expect(byCoreutils(bag, 'sha512')).toMatchObject({ status: 0, stdout: '', stderr: '' });
    await whole.remove();
  },
);

it.skipIf(!coreutils.available)('a dossier without files is checked by sha256sum as it is', async () => {
  const { out } = await make('plain');
  const { status, stdout } = spawnSync('sha256sum', ['--strict', '--check', 'manifest-sha256.txt'], {
    cwd: out,
    encoding: 'utf8',
  });
  expect(status).toBe(0);
  const others = (await readdir(out)).filter((name) => name !== 'manifest-sha256.txt').sort();
  expect(stdout).toBe(others.map((name) => `${name}: OK\n`).join(''));
  expect(others).toContain('contents.json');
  expect(others).not.toContain('ro-crate-metadata.json');
  expect(await stoplog(folder, ['dossier', '--verify', 'plain'])).toMatchObject({ status: 0 });
});

describe('an archive', () => {
  it.each(['bag.zip', 'bag.tar.gz'])('%s comes back as the folder that it is of', async (name) => {
    const { out } = await make(name, '--bag');
    expect((await stoplog(folder, ['dossier', '--verify', out])).text).toContain('is awaiting fetch');
  });

  it('is one that tar unpacks', async () => {
    const { out } = await make('for-tar.tgz', '--bag');
    spawnSync('mkdir', ['by-tar'], { cwd: folder });
    expect(
      spawnSync('tar', ['--extract', '--gzip', '--file', out], { cwd: join(folder, 'by-tar') }).status,
    ).toBe(0);
    const [top = ''] = await readdir(join(folder, 'by-tar'));
    expect(top).toMatch(/^dossier-[0-9a-f]{12}$/);
    const listed = spawnSync('tar', ['--list', '--verbose', '--utc', '--full-time', '--file', out], {
      encoding: 'utf8',
    });
    expect(
      listed.stdout.split('\n').filter((line) => line !== '' && !/^-rw[x-]r-[x-]r-[x-] 0\/0 /.test(line)),
    ).toEqual([]);
    await rm(join(folder, 'by-tar', top, 'fetch.txt'));
    expect((await stoplog(folder, ['dossier', '--verify', join('by-tar', top)])).text).toContain(
      '50% 2001.nc',
    );
  });

  it.skipIf(!unzip.available)(`is one that unzip unpacks${unzip.reason}`, async () => {
    const { out } = await make('for-unzip.zip', '--bag');
    expect(spawnSync('unzip', ['-q', '-^', out, '-d', join(folder, 'by-unzip')]).status).toBe(0);
    const [top = ''] = await readdir(join(folder, 'by-unzip'));
    const report = await stoplog(folder, ['dossier', '--verify', join('by-unzip', top)]);
    expect(report.text).toContain('is awaiting fetch');
  });
});

describe('what is there', () => {
  it('is never written over, and nothing is left behind', async () => {
    const taken = await make('taken.zip');
    const before = await readFile(taken.out);
    for (const out of [taken.out, join(folder, 'plain')]) {
      const ran = await stoplog(repository.folder, ['dossier', '--out', out]);
      expect(ran.failure).toMatchObject({ code: 'unwritable-file' });
      expect(ran.failure?.message).toContain('is there already');
    }
    expect((await readFile(taken.out)).equals(before)).toBe(true);
    expect((await readdir(folder)).filter((name) => name.endsWith('.tmp'))).toEqual([]);
  });

  it('is filled where it is an empty folder', async () => {
    spawnSync('mkdir', ['empty'], { cwd: folder });
    await make('empty');
    expect(await readdir(join(folder, 'empty'))).toContain('contents.json');
  });

  it('is said to be missing where the folder of the target is not there', async () => {
    const ran = await stoplog(repository.folder, ['dossier', '--out', join(folder, 'no/such/place')]);
    expect(ran.failure).toMatchObject({ code: 'unwritable-file' });
  });
});

it('packs five thousand files', async () => {
  const names = Array.from({ length: 5000 }, (_, place) => `gauges/g${place}.csv`);
  const many = await temporaryRepository({
    ...Object.fromEntries(names.map((name) => [name, `${name}\n`])),
    'stoplog.yaml': `stoplog: 1
study: {title: Many gauges, purpose: Invented., decision: None., phase: setup}
model: {name: pond, version: "1.0", release: "1.0.0"}
`,
  });
  for (const name of ['many.zip', 'many.tar.gz']) {
    const out = join(folder, name);
    const made = await stoplog(many.folder, ['dossier', '--bag', '--out', out]);
    expect(made.failure).toBeNull();
    const { text, status } = await stoplog(folder, ['dossier', '--verify', out]);
    expect(text).toContain('is valid');
    expect(status).toBe(0);
  }
  await many.remove();
}, 120_000);
