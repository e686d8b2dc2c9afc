import { cp, mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { gitIn } from '../harness/repository.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
const [upper, lower] = ['models/upper', 'models/lower'];

// The same invented study twice, each with its manifest, seals and files in a folder of its own.
beforeEach(async () => {
  project = await soundRepository();
  const names = (await project.git('ls-tree', '--name-only', 'HEAD')).trim().split('\n');
  await mkdir(join(project.folder, upper), { recursive: true });
  await project.git('mv', ...names, upper);
  await cp(join(project.folder, upper), join(project.folder, lower), { recursive: true });
  await project.edit(`${lower}/stoplog.yaml`, (text) =>
    text.replace('harrow-brook', 'harrow-brook-below-the-mill'),
  );
  await stoplog(project.folder, ['seal', '--all', '--only', lower]);
  await project.commit('Two models');
});
afterEach(() => project.remove());

const byManifest = async (...words: string[]) => {
  const { verdict, status } = await check(project.folder, ...words);
  const blocks = verdict.manifests.map(({ path, findings }) => [
    path,
    findings.filter(({ level }) => level === 'block').map(({ rule, record }) => `${rule} ${record}`),
  ]);
  return { status, verdict, blocks: Object.fromEntries(blocks) };
};

describe('two models in one repository', () => {
  it('are judged each alone, with one verdict', async () => {
    const sound = await byManifest();
    expect(sound.blocks).toEqual({ [`${lower}/stoplog.yaml`]: [], [`${upper}/stoplog.yaml`]: [] });
    expect(sound.status).toBe(0);
    const [first, second] = sound.verdict.manifests;
    expect(sound.verdict.totals.records).toBe((first?.records.length ?? 0) + (second?.records.length ?? 0));

    await project.edit(`${lower}/data/check.csv`, moreRain('2005-01-01'));
    await project.edit(`${lower}/stoplog.yaml`, (text) =>
      text.replace('phase: application', 'phase: calibration'),
    );
    const one = await byManifest();
    expect(one.status).toBe(1);
    expect(one.blocks[`${lower}/stoplog.yaml`]).toContain('seal.stale inputs.check-gauge');
    expect(one.blocks[`${upper}/stoplog.yaml`]).toEqual([]);
    expect(one.verdict.manifests.map(({ phase }) => phase)).toEqual(['calibration', 'application']);
    const { text } = await stoplog(project.folder, ['check']);
    expect(text.match(/^ +phase (calibration|application) /gm)).toHaveLength(2);
    // Both studies have one title.
    for (const folder of [lower, upper])
      expect(text).toMatch(new RegExp(`^ {10}${folder}/stoplog.yaml$`, 'm'));
    expect(text.match(/^(PASS|BLOCKED {3}\d+ finding)/gm)).toHaveLength(1);
  });

  it('are judged by folder with --only, as it is written in a shell too', async () => {
    await project.edit(`${lower}/data/check.csv`, moreRain('2005-01-01'));
    for (const only of [upper, `./${upper}/`, `${upper}/stoplog.yaml`]) {
      const { blocks, status } = await byManifest('--only', only);
      expect([only, blocks, status]).toEqual([only, { [`${upper}/stoplog.yaml`]: [] }, 0]);
    }
    expect((await byManifest('--only', 'models')).status).toBe(1);
    const none = await stoplog(project.folder, ['check', '--only', 'models/middle']);
    expect(none.failure).toMatchObject({
      code: 'usage',
      next: expect.stringContaining(`${lower}/stoplog.yaml, ${upper}/stoplog.yaml`),
    });
  });

  it('one that can’t be read does not hide the other', async () => {
    await project.write(`${lower}/stoplog.yaml`, 'stoplog: 1\nstudy: [\n');
    await project.edit(`${upper}/data/check.csv`, moreRain('2005-01-01'));
    const { blocks } = await byManifest();
    expect(blocks[`${lower}/stoplog.yaml`]).toContain('manifest.unreadable manifest');
    expect(blocks[`${upper}/stoplog.yaml`]).toContain('seal.stale inputs.check-gauge');
  });

  it('a file that both name as their own is said, with its other home', async () => {
    await project.edit(`${lower}/stoplog.yaml`, (text) =>
      text.replaceAll('data/check.csv', '../upper/data/check.csv'),
    );
    const { verdict } = await byManifest();
    const twice = verdict.manifests.map(({ findings }) =>
      findings.filter(({ rule }) => rule === 'manifest.claimed-twice').map(({ message }) => message),
    );
    expect(twice).toEqual([
      [
        `${upper}/data/check.csv is named as its own by this record and by inputs.check-gauge of ${upper}/stoplog.yaml.`,
      ],
      [
        `${upper}/data/check.csv is named as its own by this record and by inputs.check-gauge of ${lower}/stoplog.yaml.`,
      ],
    ]);
  });

  it('are sealed one at a time', async () => {
    await project.edit(`${lower}/data/check.csv`, moreRain('2005-01-01'));
    await project.edit(`${upper}/data/check.csv`, moreRain('2005-01-01'));
    const unclear = await stoplog(project.folder, ['seal', 'inputs.check-gauge']);
    expect(unclear.failure).toMatchObject({ code: 'usage', next: expect.stringContaining('--only') });
    const before = await project.read(`${upper}/stoplog.seals.json`);
    const sealed = await stoplog(project.folder, ['seal', 'inputs.check-gauge', '--only', lower]);
    expect(sealed.text).toContain(`git add ${lower}/stoplog.seals.json`);
    expect(await project.read(`${upper}/stoplog.seals.json`)).toBe(before);
    const { blocks } = await byManifest();
    expect(blocks[`${lower}/stoplog.yaml`]).not.toContain('seal.stale inputs.check-gauge');
    expect(blocks[`${upper}/stoplog.yaml`]).toContain('seal.stale inputs.check-gauge');
  });

  it('are sealed where somebody stands, and said so', async () => {
    await project.edit(`${upper}/data/check.csv`, moreRain('2005-01-01'));
    await project.edit(`${lower}/data/check.csv`, moreRain('2005-01-01'));
    const within = join(project.folder, lower, 'data');
    const sealed = await stoplog(within, ['seal', 'inputs.check-gauge']);
    expect(sealed.text).toMatch(/^Records of models\/lower\/stoplog\.yaml\n\nSEALED by/);
    expect(sealed.text).toContain('To stage   git add ../stoplog.seals.json');
    const { blocks } = await byManifest();
    expect(blocks[`${lower}/stoplog.yaml`]).not.toContain('seal.stale inputs.check-gauge');
    expect(blocks[`${upper}/stoplog.yaml`]).toContain('seal.stale inputs.check-gauge');
    // A record that only the other one has.
    await project.edit(`${upper}/stoplog.yaml`, (text) => text.replaceAll('check-gauge', 'upper-gauge'));
    const other = await stoplog(within, ['seal', 'inputs.upper-gauge']);
    expect(other.text).toMatch(/^Records of models\/upper\/stoplog\.yaml\n/);
  });

  it('are named from where somebody stands, or from the top; the report is the same', async () => {
    const json = async (at: string, only: string) =>
      (await stoplog(join(project.folder, at), ['check', '--report', 'json', '--only', only])).text;
    await project.edit(`${lower}/data/check.csv`, moreRain('2005-01-01'));
    const expected = await json('', lower);
    expect(JSON.parse(expected).manifests).toHaveLength(1);
    for (const [at, only] of [
      [lower, '.'],
      [`${lower}/data`, '.'],
      [`${lower}/data`, '..'],
      ['models', 'lower'],
      [upper, '../lower/'],
      [upper, lower],
      [lower, 'stoplog.yaml'],
    ] as const)
      expect([at, only, await json(at, only)]).toEqual([at, only, expected]);
    expect(JSON.parse(await json('', '.')).manifests).toHaveLength(2);
    expect(JSON.parse(await json(lower, 'inputs')).manifests).toHaveLength(2);
    for (const only of ['../../..', '']) {
      const outside = await stoplog(join(project.folder, lower), ['check', '--only', only]);
      expect(outside.failure).toMatchObject({ code: 'usage' });
    }
  });

  it('a command to type for git works in a folder below', async () => {
    await project.git('rm', '--quiet', '--cached', `${lower}/data/check.csv`);
    const within = join(project.folder, lower, 'data');
    const { text } = await stoplog(within, ['check', '--only', '.']);
    const [, ...words] = /to clear +(git add \S+)/.exec(text)?.[1]?.split(' ') ?? [];
    await gitIn(within)(...words);
    expect(await project.git('ls-files', lower)).toContain(`${lower}/data/check.csv`);
  });

  it('one that a change takes away is missed', async () => {
    await project.git('checkout', '--quiet', '-b', 'change');
    await project.git('rm', '--quiet', `${lower}/stoplog.yaml`);
    await project.git('commit', '--quiet', '-m', 'Nobody needs it');
    const { verdict } = await byManifest('--at', 'HEAD', '--base', 'main');
    expect(verdict.comparison?.notes).toEqual([
      expect.stringContaining(`${lower}/stoplog.yaml is gone since`),
    ]);
  });
});
