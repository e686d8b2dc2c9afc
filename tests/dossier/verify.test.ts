import { cp, mkdtemp, readFile, realpath, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { globSync } from 'glob';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { verifyPackage } from '../../src/dossier/verify/verify-package.ts';
import { stoplog } from '../harness/command.ts';
import type { TemporaryRepository } from '../harness/repository.ts';
import { awkwardRepository, sha256 } from './awkward.ts';

let folder: string;
let repository: TemporaryRepository;
beforeAll(async () => {
  folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
  repository = await awkwardRepository(false);
  for (const words of [
    ['--bag', '--out', join(folder, 'bag')],
    ['--out', join(folder, 'plain')],
  ]) {
    const { failure } = await stoplog(repository.folder, ['dossier', ...words]);
    expect(failure).toBeNull();
  }
});
afterAll(async () => {
  await rm(folder, { recursive: true });
  await repository.remove();
});

const filesOf = (top: string) => globSync('**', { cwd: join(folder, top), nodir: true, dot: true }).sort();

/** A copy of a package with changes. */
async function changed(top: string, change: (copy: string) => Promise<void>) {
  const copy = join(folder, 'copy');
  await cp(join(folder, top), copy, { recursive: true });
  await change(copy);
  const report = await verifyPackage(copy);
  await rm(copy, { recursive: true });
  return report;
}

describe.each(['bag', 'plain'])('one bit of any file of a %s', (top) => {
  it('is noticed, and the file is named', async () => {
    const files = filesOf(top);
    expect(files.length).toBeGreaterThan(top === 'bag' ? 25 : 7);
    for (const path of files) {
      const { status, problems } = await changed(top, async (copy) => {
        const bytes = await readFile(join(copy, path));
        const place = Math.floor(bytes.length / 2);
        const flipped = Buffer.concat([
          bytes.subarray(0, place),
          Buffer.from([(bytes[place] ?? 0) ^ 1]),
          bytes.subarray(place + 1),
        ]);
        await writeFile(join(copy, path), flipped);
      });
      expect(['broken', 'incomplete']).toContain(status);
      const told = problems.map(({ file, message }) => `${file}: ${message}`).join('\n');
      expect(told).toContain(path.normalize('NFC'));
    }
  });
});

describe('completeness goes both ways', () => {
  it.each([
    ['bag', 'data/repository/model/run.sh'],
    ['bag', 'bagit.txt'],
    ['bag', 'manifest-sha256.txt'],
    ['plain', 'findings.json'],
  ])('in a %s without %s', async (top, path) => {
    const { status, problems } = await changed(top, (copy) => rm(join(copy, path)));
    expect(status).toBe('incomplete');
    expect(problems).toContainEqual(expect.objectContaining({ kind: 'incomplete', file: path }));
  });

  it.each([
    ['bag', 'data/more.txt'],
    ['plain', 'more.txt'],
  ])('in a %s with %s beside', async (top, path) => {
    const { status, problems } = await changed(top, (copy) => writeFile(join(copy, path), 'x'));
    expect(status).toBe('incomplete');
    expect(problems).toContainEqual(
      expect.objectContaining({
        file: path,
        message: expect.stringMatching(/not listed in manifest-sha256/),
      }),
    );
  });

  it('but a bag may hold tag files of others', async () => {
    expect((await changed('bag', (copy) => writeFile(join(copy, 'notes.txt'), 'x'))).status).toBe('valid');
  });
});

it('a Payload-Oxum that does not fit is told', async () => {
  const { problems } = await changed('bag', async (copy) => {
    const info = await readFile(join(copy, 'bag-info.txt'), 'utf8');
    await writeFile(join(copy, 'bag-info.txt'), info.replace(/(Payload-Oxum: )(\d+)/, '$17'));
  });
  expect(problems).toContainEqual({
    kind: 'incomplete',
    file: 'bag-info.txt',
    message: expect.stringMatching(/^says Payload-Oxum 7\.\d+, found \d+\.\d+/),
  });
});

describe('documents that disagree are named though every digest is right', () => {
  /** Edits a document of the plain dossier and puts its new digest into the list, as a careful forger would. */
  const forged = (name: string, change: (old: string) => string) =>
    changed('plain', async (copy) => {
      const path = join(copy, name);
      const old = await readFile(path, 'utf8');
      const text = change(old);
      expect(text).not.toBe(old);
      await writeFile(path, text);
      const list = join(copy, 'manifest-sha256.txt');
      await writeFile(list, (await readFile(list, 'utf8')).replace(sha256(old), sha256(text)));
    });

  it.each([
    [
      'findings.json',
      '"verdict": "pass"',
      '"verdict": "blocked"',
      /says "blocked" for the verdict, but contents\.json says "pass"/,
    ],
    [
      'findings.json',
      /"state": "\w+"/,
      '"state": "contradicted"',
      /says "contradicted" for the state of record "\w+" in "stoplog\.yaml"/,
    ],
    ['facts.json', /"digest": "\w+"/, `"digest": "${'0'.repeat(64)}"`, /for the digest of record/],
    ['facts.json', '"draft": false', '"draft": true', /says true for the draft/],
    ['facts.json', /"commit": "\w+"/, `"commit": "${'0'.repeat(40)}"`, /says "0+" for the commit/],
    ['crosswalk.json', /"commit": "\w+"/, `"commit": "${'0'.repeat(40)}"`, /does not name the commit/],
    ['CITATION.cff', /[0-9a-f]{40}/g, '0'.repeat(40), /does not name the commit/],
  ])('%s with another %s', async (file, old, now, message) => {
    const { status, problems } = await forged(file, (text) => text.replace(old, now));
    expect(status).toBe('broken');
    expect(problems).toContainEqual({ kind: 'broken', file, message: expect.stringMatching(message) });
    expect(new Set(problems.map((problem) => problem.file))).toEqual(new Set([file]));
  });
});

it('the command names the file, and ends with 1', async () => {
  await cp(join(folder, 'plain'), join(folder, 'told'), { recursive: true });
  await writeFile(join(folder, 'told/findings.json'), '{}');
  const { status, text } = await stoplog(folder, ['dossier', '--verify', 'told']);
  expect(status).toBe(1);
  expect(text).toMatch(/^told is broken/);
  expect(text).toMatch(/^ {2}findings\.json: has the sha256 \w+, but manifest-sha256\.txt says \w+\.$/m);
});
