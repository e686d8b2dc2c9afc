import { afterEach, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
afterEach(() => project.remove());

/** On a branch of its own, somebody corrects a title-like fact of the model, seals and commits. */
async function sealOnBranch(branch: string, change: (manifest: string) => string): Promise<void> {
  await project.git('switch', '--quiet', '--create', branch, 'main');
  await project.edit('stoplog.yaml', change);
  const { status, text } = await stoplog(project.folder, ['seal', '--all', '--because', 'no number changed']);
  if (status !== 0) throw new Error(text);
  await project.commit(branch);
}

const newDecision = (text: string) => text.replace('between June and September', 'between May and September');
const newArea = (text: string) => text.replace('latitude: 52.5', 'latitude: 52.51');

/** A merge in conflict; the manifest is merged by hand: the other branch's decision, this branch's latitude. */
async function mergeOfDecisions(): Promise<void> {
  project = await soundRepository();
  await sealOnBranch('decision', newDecision);
  await sealOnBranch('both', (text) =>
    newArea(text.replace('between June and September', 'between May and October')),
  );
  await expect(project.git('merge', '--no-edit', 'decision')).rejects.toThrow(/CONFLICT/);
  await project.git('checkout', '--theirs', 'stoplog.yaml');
  await project.edit('stoplog.yaml', newArea);
}

describe('two branches that both sealed are merged', () => {
  it('heals the seals file, keeping the side whose seal fits, and loses nothing', async () => {
    await mergeOfDecisions();

    const conflicted = await check(project.folder);
    expect(conflicted.blocking).toContain('seal.unreadable manifest');

    const healed = await stoplog(project.folder, ['seal']);
    expect(healed.failure).toBeNull();
    expect(healed.text).toContain('HEALED after a merge');
    expect(healed.text).toMatch(
      /study {3}the other branch’s seal is kept \(Test Modeller .*2021-03-01\): it fits what is merged/,
    );
    expect(healed.text).toMatch(/To stage {3}git add stoplog\.seals\.json/);

    const after = await check(project.folder);
    expect(after.found.filter((one) => one.startsWith('seal.'))).toEqual([]);
    expect(after.verdict.totals.records).toBe(conflicted.verdict.totals.records);
  });

  it.each(['--ours', '--theirs'])('finds again what git checkout %s left out', async (taken) => {
    await mergeOfDecisions();
    await project.git('checkout', taken, 'stoplog.seals.json');
    await project.commit('Merged');
    const left = taken === '--ours' ? 'study' : 'catchment';
    expect((await check(project.folder)).state(left)).toBe('stale');

    const healed = await stoplog(project.folder, ['seal', left], '2021-04-01');
    expect(healed.text).toMatch(new RegExp(`HEALED after a merge\n {2}${left} {3}.*2021-03-01`));
    expect(healed.text).not.toContain('SEALED by');
    expect((await check(project.folder)).found.filter((one) => one.startsWith('seal.'))).toEqual([]);
  });

  it('follows a file that one branch renamed while the other sealed a new version of it', async () => {
    project = await soundRepository();
    await project.git('switch', '--quiet', '--create', 'renamed');
    await project.git('mv', 'data/check.csv', 'data/gauge.csv');
    await project.edit('stoplog.yaml', (text) => text.replaceAll('data/check.csv', 'data/gauge.csv'));
    await stoplog(project.folder, ['seal', '--moved']);
    await project.commit();
    await project.git('switch', '--quiet', 'main');
    await project.edit('data/check.csv', moreRain('2005-01-01'));
    await stoplog(project.folder, ['seal', '--all'], '2021-03-05');
    await project.commit();
    await expect(project.git('merge', '--no-edit', 'renamed')).rejects.toThrow(/CONFLICT.*seals/);

    const { text } = await stoplog(project.folder, ['seal']);
    expect(text).toMatch(/inputs\.check-gauge {3}this branch’s seal is kept \(.*2021-03-05\): it fits/);
    expect((await check(project.folder)).found.filter((one) => one.startsWith('seal.'))).toEqual([]);
  });

  it('heals a criss-cross, where what both sides come from is itself in conflict', async () => {
    project = await soundRepository();
    await project.git('config', 'merge.conflictStyle', 'diff3');
    await sealOnBranch('one', newArea);
    await sealOnBranch('two', (text) => text.replace('latitude: 52.5', 'latitude: 52.52'));
    const [one, two] = [await project.git('rev-parse', 'one'), await project.git('rev-parse', 'two')];
    for (const [branch, other] of [
      ['one', two],
      ['two', one],
    ] as const) {
      await project.git('switch', '--quiet', branch);
      await expect(project.git('merge', '--no-edit', other.trim())).rejects.toThrow(/CONFLICT/);
      await project.git('checkout', '--ours', 'stoplog.yaml');
      await stoplog(project.folder, ['seal']);
      await project.commit('Crossed');
    }
    await project.edit('data/check.csv', moreRain('2005-01-01'));
    await stoplog(project.folder, ['seal', '--all'], '2021-03-05');
    await project.commit();
    await expect(project.git('merge', '--no-edit', 'one')).rejects.toThrow(/CONFLICT.*seals/);
    await project.git('checkout', '--theirs', 'stoplog.yaml');

    const { text } = await stoplog(project.folder, ['seal']);
    expect(text).toMatch(/catchment {3}the other branch’s seal is kept/);
    const seals = await project.read('stoplog.seals.json');
    expect(seals).toContain('"sealed_on": "2021-03-05"');
    expect((await check(project.folder)).found.filter((one) => one.startsWith('seal.'))).toEqual([]);
  });

  it('finds again in a rebase what git checkout --ours left out', async () => {
    project = await soundRepository();
    await sealOnBranch('upstream', newArea);
    await sealOnBranch('work', (text) => newDecision(text.replace('latitude: 52.5', 'latitude: 52.52')));
    await project.edit('data/check.csv', moreRain('2005-01-01'));
    await stoplog(project.folder, ['seal', '--all'], '2021-03-05');
    await project.git('commit', '--quiet', '--all', '--amend', '--no-edit');
    await expect(project.git('rebase', 'upstream')).rejects.toThrow(/CONFLICT/);
    await project.git('checkout', '--theirs', 'stoplog.yaml');
    await project.git('checkout', '--ours', 'stoplog.seals.json');
    await project.git('add', '--all');

    const { text } = await stoplog(project.folder, ['seal']);
    expect(text).toMatch(/study {3}the other branch’s seal is kept/);
    expect(text).toMatch(/inputs\.check-gauge {3}the other branch’s seal is kept/);
    expect((await check(project.folder)).found.filter((one) => one.startsWith('seal.'))).toEqual([]);
  });

  it.each([
    ['cherry-pick', ['cherry-pick', 'work']],
    ['stash pop', ['stash', 'pop']],
  ])('heals a conflict of git %s', async (name, command) => {
    project = await soundRepository();
    await sealOnBranch('both', (text) =>
      newArea(text.replace('between June and September', 'between May and October')),
    );
    await project.git('switch', '--quiet', '--create', 'work', 'main');
    await project.edit('stoplog.yaml', newDecision);
    await stoplog(project.folder, ['seal', '--all', '--because', 'no number changed'], '2021-03-05');
    await (name === 'stash pop' ? project.git('stash', '--quiet') : project.commit());
    await project.git('switch', '--quiet', 'both');
    await expect(project.git(...command)).rejects.toThrow(/CONFLICT/);
    await project.git('checkout', '--theirs', 'stoplog.yaml');
    await project.edit('stoplog.yaml', newArea);

    const { text, failure } = await stoplog(project.folder, ['seal']);
    expect(failure).toBeNull();
    expect(text).toMatch(/study {3}the other branch’s seal is kept \(.*2021-03-05\)/);
    expect((await check(project.folder)).found.filter((one) => one.startsWith('seal.'))).toEqual([]);
  });

  it('finds again what any branch of an octopus sealed', async () => {
    project = await soundRepository();
    await sealOnBranch('area', newArea);
    await sealOnBranch('decision', newDecision);
    await project.git('switch', '--quiet', 'main');
    await project.edit('data/check.csv', moreRain('2005-01-01'));
    await stoplog(project.folder, ['seal', '--all']);
    await project.commit();
    await project.git('merge', '--quiet', '--no-commit', 'area', 'decision');
    expect((await check(project.folder)).found.filter((one) => one.startsWith('seal.'))).toEqual([]);
    await project.git('checkout', 'main', '--', 'stoplog.seals.json');
    const { text } = await stoplog(project.folder, ['seal']);
    expect(text).toMatch(/study {3}the other branch’s seal is kept/);
    expect(text).toMatch(/catchment {3}the other branch’s seal is kept/);
  });

  it('puts the seals together from the commits of the merge where the file was torn by hand', async () => {
    await mergeOfDecisions();
    await project.edit('stoplog.seals.json', (text) => text.replaceAll(/^(<{7}|={7}|>{7}).*\n|,$/gm, ''));
    await project.commit('Merged');
    expect((await check(project.folder)).blocking).toContain('seal.unreadable manifest');
    const { text } = await stoplog(project.folder, ['seal']);
    expect(text).toMatch(/study {3}the other branch’s seal is kept/);
    expect((await check(project.folder)).found.filter((one) => one.startsWith('seal.'))).toEqual([]);
  });

  it('claims nothing and writes nothing where there is no whole version', async () => {
    project = await soundRepository();
    await project.edit('stoplog.seals.json', (text) => text.slice(0, 3000));
    const torn = await project.read('stoplog.seals.json');
    for (const words of [['seal'], ['seal', '--all', '--figures']]) {
      const { text, status } = await stoplog(project.folder, words);
      expect(text).toMatch(/^NOT SEALED\n {2}stoplog\.seals\.json\n/);
      expect(text).toContain('git checkout HEAD -- :/stoplog.seals.json');
      expect([status, await project.read('stoplog.seals.json')]).toEqual([1, torn]);
    }
  });

  it('leaves a record stale where neither side’s seal fits', async () => {
    project = await soundRepository();
    await sealOnBranch('one', newDecision);
    await sealOnBranch('two', (text) =>
      text.replace('between June and September', 'between June and August'),
    );
    await expect(project.git('merge', '--no-edit', 'one')).rejects.toThrow(/CONFLICT/);
    await project.git('checkout', '--theirs', 'stoplog.yaml');
    await project.edit('stoplog.yaml', (text) =>
      text.replace('between May and September', 'between May and August'),
    );
    const healed = await stoplog(project.folder, ['seal']);
    expect(healed.text).toMatch(/study {3}the older seal is kept \(.*2021-02-01\): it does not fit/);
    expect((await check(project.folder)).state('study')).toBe('stale');
  });
});
