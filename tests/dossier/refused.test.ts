import { mkdtemp, readFile, realpath, rm, stat } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { Contents } from '../../src/dossier/contents.ts';
import { stoplog } from '../harness/command.ts';
import { temporaryRepository } from '../harness/repository.ts';
import { moreRain, soundRepository } from '../harness/sound-repository.ts';

let folder: string;
beforeEach(async () => {
  folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
});
afterEach(() => rm(folder, { recursive: true }));

const out = () => join(folder, 'dossier');
const contents = async () => JSON.parse(await readFile(join(out(), 'contents.json'), 'utf8')) as Contents;

describe('a study that the check blocks', () => {
  it('gets no dossier but a draft, which says so; its commit before gets one', async () => {
    const project = await soundRepository();
    await project.edit('data/rain.csv', moreRain('2003-05-05'));
    await project.commit();
    const refused = await stoplog(project.folder, ['dossier', '--out', out()]);
    expect(refused.status).toBe(1);
    expect(refused.text).toMatch(/inputs\.rainfall {3}stale[\s\S]*No dossier was written/);
    await expect(stat(out())).rejects.toThrow(/ENOENT/);

    const draft = await stoplog(project.folder, ['dossier', '--out', out(), '--draft']);
    expect(draft.status).toBe(0);
    expect(draft.text).toContain('A draft');
    expect(await contents()).toMatchObject({ draft: true, verdict: 'blocked' });
    await rm(out(), { recursive: true });

    // What is staged or edited since is no part of it.
    await project.edit('data/rain.csv', moreRain('2003-05-06'));
    const before = await stoplog(project.folder, ['dossier', '--at', 'HEAD~1', '--out', out(), '--draft']);
    expect(before.status).toBe(0);
    expect(await contents()).toMatchObject({
      draft: false,
      verdict: 'pass',
      commit: (await project.git('rev-parse', 'HEAD~1')).trim(),
    });
    await project.remove();
  });

  it('gets none at all where its manifest can’t be read', async () => {
    const broken = await temporaryRepository({ 'stoplog.yaml': 'stoplog: [\n' });
    const { status, text } = await stoplog(broken.folder, ['dossier', '--out', out(), '--draft']);
    expect(status).toBe(1);
    expect(text).toMatch(/manifest\.unreadable[\s\S]*No dossier was written/);
    await broken.remove();
  });
});

describe('names that can’t be unpacked everywhere', () => {
  const young =
    'stoplog: 1\nstudy: {title: T, purpose: Invented., decision: None., phase: setup}\nmodel: {name: pond, version: "1.0", release: "1.0.0"}\n';

  it.each([
    ['data/Rain.csv', 'data/rain.csv', /"data\/rain\.csv".*differ only in case|differ only in case/],
    ['Data/a.csv', 'data/b.csv', /differ only in case/],
    ['data/é.csv'.normalize('NFC'), 'data/é.csv'.normalize('NFD'), /form of an accent/],
    ['data/nul.csv', 'data/x.csv', /"nul\.csv" is the name of a device/],
    ['data/12:00.csv', 'data/x.csv', /"12:00\.csv" holds a character/],
    ['data/back\\slash.csv', 'data/x.csv', /backslash/],
    ['data/dot.', 'data/x.csv', /ends in a point/],
  ])('%s is refused in a bag, and no matter in the documents alone', async (first, second, message) => {
    const repository = await temporaryRepository({ 'stoplog.yaml': young, [first]: '1\n', [second]: '2\n' });
    const { status, text } = await stoplog(repository.folder, ['dossier', '--bag', '--out', out()]);
    expect(status).toBe(1);
    expect(text).toMatch(message);
    await expect(stat(out())).rejects.toThrow(/ENOENT/);
    expect(await stoplog(repository.folder, ['dossier', '--out', out()])).toMatchObject({ status: 0 });
    await repository.remove();
  });
});

it('of several studies, one by its folder is packed alone', async () => {
  const young =
    'stoplog: 1\nstudy: {title: T, purpose: Invented., decision: None., phase: setup}\nmodel: {name: pond, version: "1.0", release: "1.0.0"}\n';
  const repository = await temporaryRepository({
    'east/stoplog.yaml': young,
    'east/rain.csv': '1\n',
    'west/stoplog.yaml': 'stoplog: 1\n',
    'more.txt': 'x\n',
  });
  const words = ['dossier', '--bag', '--out', out()];
  expect((await stoplog(repository.folder, words)).status).toBe(1);
  expect((await stoplog(repository.folder, [...words, '--only', 'model'])).failure?.next).toContain(
    'east, west',
  );
  expect((await stoplog(repository.folder, [...words, '--only', './east/'])).status).toBe(0);
  const text = await readFile(join(out(), 'data/contents.json'), 'utf8');
  expect((JSON.parse(text) as Contents).files.map(({ path }) => path)).toEqual([
    'east/rain.csv',
    'east/stoplog.yaml',
  ]);
  await repository.remove();
});

it('without a place to write is no command', async () => {
  const project = await soundRepository();
  expect((await stoplog(project.folder, ['dossier'])).failure).toMatchObject({ code: 'usage' });
  for (const out of ['dossier.tar', 'dossier.tar.xz', 'dossier.7z'])
    expect((await stoplog(project.folder, ['dossier', '--out', out])).failure?.next).toContain('.tar.gz');
  expect(
    (await stoplog(project.folder, ['dossier', '--at', 'no-such', '--out', out()])).failure,
  ).toMatchObject({
    code: 'unknown-revision',
  });
  await project.remove();
});
