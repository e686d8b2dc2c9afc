import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import type { Seal } from '../../src/records/seal.ts';
import { check, stoplog } from '../harness/command.ts';
import { type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
afterEach(() => project.remove());

describe('a file is renamed, its bytes are the same', () => {
  it('is followed by `seal --moved`, with the person and the date of the seal', async () => {
    project = await soundRepository();
    // That the commit before was a merge makes no difference.
    await project.git('checkout', '--quiet', '-b', 'visit');
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.commit('Visit');
    await project.git('checkout', '--quiet', 'main');
    await project.git('merge', '--quiet', '--no-ff', '--no-edit', 'visit');
    await mkdir(join(project.folder, 'data/gauges'));
    await project.git('mv', 'data/rain.csv', 'data/gauges/rain.csv');
    const lost = (await check(project.folder)).verdict.manifests[0]?.findings;
    expect(lost).toContainEqual(
      expect.objectContaining({
        rule: 'seal.stale',
        record: 'inputs.rainfall',
        clear: expect.stringMatching(/^If it was renamed, write its new path .* stoplog seal --moved/),
      }),
    );
    const tooEarly = await stoplog(project.folder, ['seal', '--moved']);
    expect(tooEarly.text).toContain('write its new path in the manifest first');

    await project.edit('stoplog.yaml', (text) => text.replaceAll('data/rain.csv', 'data/gauges/rain.csv'));
    const { state, verdict } = await check(project.folder);
    expect(state('inputs.rainfall')).toBe('stale');
    expect(verdict.manifests[0]?.findings).toContainEqual(
      expect.objectContaining({
        rule: 'seal.stale',
        record: 'inputs.rainfall',
        clear: expect.stringMatching(/^For the renamed file: stoplog seal --moved/),
      }),
    );

    const moved = await stoplog(project.folder, ['seal', '--moved'], '2021-04-01');
    expect(moved.text).toContain('data/rain.csv -> data/gauges/rain.csv');
    expect(moved.text).not.toContain('HEALED');
    const { records } = JSON.parse(await project.read('stoplog.seals.json')) as {
      records: Record<string, Seal>;
    };
    expect(records['inputs.rainfall']?.sealed_on).toBe('2021-02-01');
    expect(Object.keys(records['inputs.rainfall']?.files ?? {})).toContain('data/gauges/rain.csv');
    expect(records['runs.calibrated']?.sealed_on).toBe('2021-02-01');
    expect((await check(project.folder)).found.filter((one) => one.startsWith('seal.'))).toEqual([]);
  });

  it('on two branches, to another name on each: `seal` puts the seals together', async () => {
    project = await soundRepository();
    for (const [branch, path] of [
      ['ours', 'data/rain-a.csv'],
      ['theirs', 'data/rain-b.csv'],
    ] as const) {
      await project.git('checkout', '--quiet', '-b', branch, 'main');
      await project.git('mv', 'data/rain.csv', path);
      await project.edit('stoplog.yaml', (text) => text.replaceAll('data/rain.csv', path));
      await stoplog(project.folder, ['seal', '--moved']);
      await project.commit(branch);
    }
    await project.git('checkout', '--quiet', 'ours');
    await expect(project.git('merge', '--quiet', 'theirs')).rejects.toThrow();
    await project.git('checkout', 'HEAD', '--', 'stoplog.yaml');
    await project.git('rm', '--quiet', '--cached', 'data/rain.csv', 'data/rain-b.csv');
    await project.git('add', 'data/rain-a.csv');
    expect(await project.read('stoplog.seals.json')).toContain('<<<<<<<');

    const healed = await stoplog(project.folder, ['seal']);
    expect(healed.text).toMatch(/^HEALED after a merge\n {2}both sides hold the same seals/);
    expect(healed.text).toContain('git add stoplog.seals.json');
    expect((await check(project.folder)).found.filter((one) => one.startsWith('seal.'))).toEqual([]);
  });
});
