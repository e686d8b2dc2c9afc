import { cp, mkdir, mkdtemp, readdir, readFile, realpath, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { kinds } from '../../src/commands/report-kinds.ts';
import { check, stoplog } from '../harness/command.ts';
import { gitIn, type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';

const example = join(import.meta.dirname, '../../example-project');
const rain = 'data/rain/high-tarrow.csv';

let folder: string;
let source: TemporaryRepository;

/** A clone of the source, by default a whole one. */
async function clone(name: string, ...options: string[]): Promise<string> {
  await gitIn(folder)('clone', '--quiet', ...options, `file://${source.folder}`, name);
  return join(folder, name);
}

/** A partial clone with everything but the daily and monthly series. */
async function cloneWithoutSeries(name: string): Promise<string> {
  await source.git('config', 'uploadpack.allowFilter', 'true');
  const cloned = await clone(name, '--no-checkout', '--filter=blob:none');
  await gitIn(cloned)('checkout', '--quiet', 'HEAD', '--', '.', ':!data/**/*.csv', ':!runs/**/*.csv');
  return cloned;
}

const partsOf = (cloned: string) => join(cloned, '.git/stoplog/parts');

/** Each part in a clone of its own, as on the machines of a matrix; then what they left is brought to `gathering`. */
async function workInParts(of: number, gathering: string, ...words: string[]): Promise<void> {
  await mkdir(partsOf(gathering), { recursive: true });
  for (let number = 1; number <= of; number++) {
    const cloned = await clone(`part-${number}`);
    const { status, text } = await stoplog(cloned, ['check', ...words, '--part', `${number}of${of}`]);
    expect({ status, text }).toMatchObject({
      status: 0,
      text: expect.stringContaining(`part ${number} of ${of}`),
    });
    await cp(partsOf(cloned), partsOf(gathering), { recursive: true });
  }
}

/** Every report of a check, by kind; and what was said beside them. */
async function reportsOf(cloned: string, ...words: string[]) {
  const asked = kinds.flatMap((kind) => ['--report', `${kind}=reports/${kind}`]);
  const ran = await stoplog(cloned, ['check', ...words, ...asked]);
  expect(ran.failure).toBeNull();
  const texts = await Promise.all(kinds.map((kind) => readFile(join(cloned, 'reports', kind), 'utf8')));
  return {
    status: ran.status,
    said: ran.text,
    reports: Object.fromEntries(kinds.map((kind, at) => [kind, texts[at]])),
  };
}

describe('work shared in parts', () => {
  beforeEach(async () => {
    folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
    source = await temporaryRepository();
    await cp(example, source.folder, { recursive: true });
    await source.git('add', '--all');
    await source.git('commit', '--quiet', '--message', 'The example');
  });
  afterEach(async () => {
    await source.remove();
    await rm(folder, { recursive: true });
  });

  it('gives the reports of one run, byte for byte, of a change against a base', async () => {
    // The same in every run: what it is compared with, a changed gauge, and a stated score that is no longer so.
    const path = join(source.folder, rain);
    const changed = (await readFile(path, 'utf8')).replace(/^(2011-0[3-6]-\d\d),[\d.]+/gm, '$1,31.4');
    await source.write(rain, changed);
    await source.git('commit', '--quiet', '--all', '--message', 'New data');
    const words = ['--at', 'HEAD', '--base', 'HEAD~1'];
    const [gathering, alone] = [await clone('gathering'), await clone('alone')];
    await workInParts(3, gathering, ...words);
    const gathered = await reportsOf(gathering, ...words, '--gather');
    expect(gathered.said).toBe('');
    expect(gathered).toEqual(await reportsOf(alone, ...words));
    expect(gathered.status).toBe(1);
  });

  it('reads no series again: the verdict stands where their content was never fetched', async () => {
    const [gathering, without] = [await cloneWithoutSeries('gathering'), await cloneWithoutSeries('without')];
    await workInParts(3, gathering, '--at', 'HEAD');
    const { status, verdict } = await check(gathering, '--at', 'HEAD', '--gather');
    const whole = await check(await clone('whole'), '--at', 'HEAD');
    expect({ status, verdict }).toEqual({ status: whole.status, verdict: whole.verdict });
    expect((await check(without, '--at', 'HEAD')).verdict).not.toEqual(verdict);
  });

  it('is shared: no file is digested twice, and nothing worked out twice', async () => {
    const gathering = await clone('gathering');
    await workInParts(4, gathering, '--at', 'HEAD');
    const lines = async (name: string) => {
      const files = (await readdir(partsOf(gathering))).map((part) => join(partsOf(gathering), part, name));
      const texts = await Promise.all(files.map((file) => readFile(file, 'utf8')));
      return texts.map((text) => text.trimEnd().split('\n').slice(1, -1));
    };
    for (const name of ['digests', 'values']) {
      const shares = await lines(name);
      // Files below 1024 bytes, which may be Git LFS pointers, are read by every part.
      const large = shares.map((share) =>
        share.filter((line) => name === 'values' || Number(line.split(' ')[3]) >= 1024),
      );
      expect(shares.every((share) => share.length > 0)).toBe(true);
      expect(new Set(large.flat()).size).toBe(large.flat().length);
    }
  });

  it('that was not all done is done by the one that gathers, which says so', async () => {
    const gathering = await clone('gathering');
    await workInParts(3, gathering, '--at', 'HEAD');
    await rm(join(partsOf(gathering), '2of3'), { recursive: true });
    await mkdir(join(partsOf(gathering), '1of2'));
    const gathered = await reportsOf(gathering, '--at', 'HEAD', '--gather');
    expect(gathered.said).toMatch(/^2of3 left no work here/);
    const none = await clone('none');
    const alone = await reportsOf(none, '--at', 'HEAD', '--gather');
    expect(alone.said).toContain('no part of the work was left here');
    expect(gathered.reports).toEqual(alone.reports);
  });

  it('may be compared with a time before there was a manifest', async () => {
    const empty = (await source.git('hash-object', '-t', 'tree', '/dev/null')).trim();
    const first = (await source.git('commit-tree', '-m', 'Nothing yet', empty)).trim();
    await source.git('reset', '--quiet', '--soft', first);
    await source.git('commit', '--quiet', '--message', 'The example, later');
    const { status, text } = await stoplog(source.folder, [
      ...['check', '--at', 'HEAD', '--base', 'HEAD~1', '--part', '1of2'],
    ]);
    expect({ status, text }).toEqual({ status: 0, text: expect.stringContaining('part 1 of 2') });
  });
});

it.each([
  [['--part', '3of2'], 'no part of a whole'],
  [['--part', '0of2'], 'no part of a whole'],
  [['--part', '2/8'], 'no part of a whole'],
  [['--part', '1of2', '--gather'], 'do not go together'],
  [['--part', '1of2', '--report', 'json'], 'do not go together'],
  [['--gather', '--no-cache'], 'do not go together'],
  [['--part', '1of2', '--no-cache'], 'do not go together'],
])('a share of the work is asked for in words that make sense: %j', async (words, said) => {
  const { status, failure } = await stoplog(tmpdir(), ['check', ...words]);
  expect(status).toBe(2);
  expect(failure?.message).toContain(said);
});
