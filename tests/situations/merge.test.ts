import { afterEach, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

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
