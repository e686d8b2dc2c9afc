import { afterEach, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
afterEach(() => project.remove());

describe('data edited, nothing rerun', () => {
  it('makes the input, and all that rests on it, stale, down to the bytes', async () => {
    project = await soundRepository();
    expect((await check(project.folder)).blocking).toEqual([]);

    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    const checked = await check(project.folder);

    expect(checked.status).toBe(1);
    expect(checked.blocking.filter((one) => one.startsWith('seal.'))).toEqual(
      [
        'inputs.rainfall',
        'parameters',
        'runs.calibrated',
        'runs.dry',
        'evaluation.outlet-flow',
        'balance.catchment',
        'interventions',
        'uncertainty',
        'scenarios.dry',
      ].map((record) => `seal.stale ${record}`),
    );
    const root = checked.finding('seal.stale', 'inputs.rainfall');
    expect(root.detail.join()).toMatch(
      /^1 of 3 287 values differ; total .* -> .* mm \(\+.* %\), on 2005-01-01$/,
    );
    expect(root.message).toContain('data/rain.csv');
    expect(checked.finding('seal.stale', 'evaluation.outlet-flow').trail).toEqual([
      'evaluation.outlet-flow',
      'runs.calibrated',
      'inputs.rainfall',
      'data/rain.csv',
    ]);
    expect(checked.state('inputs.temperature')).toBe('sound');
    expect(checked.state('inputs.check-gauge')).toBe('sound');
  });

  it('is sealed again only with a reason, where the outputs did not move', async () => {
    project = await soundRepository();
    await project.edit('data/rain.csv', moreRain('2005-01-01'));

    const refused = await stoplog(project.folder, ['seal', '--all']);
    expect(refused.status).toBe(1);
    expect(refused.text).toContain('inputs.rainfall   was stale');
    expect(refused.text).toMatch(/NOT SEALED\n {2}parameters/);
    expect((await check(project.folder)).state('runs.calibrated')).toBe('stale');

    const reason = 'typing error in a day that the model does not read';
    const sealed = await stoplog(project.folder, ['seal', '--all', '--because', reason]);
    expect(sealed.status).toBe(0);
    expect(sealed.text).toContain(`though it did not change: ${reason}`);
    expect(await project.read('stoplog.seals.json')).toContain(reason);
    const { blocking } = await check(project.folder);
    expect(blocking.filter((one) => one.startsWith('seal.'))).toEqual([]);
  });
});
