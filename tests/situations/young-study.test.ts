import { afterEach, describe, expect, it } from 'vitest';
import { check } from '../harness/command.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
afterEach(() => project.remove());

describe('a young study', () => {
  it('is not held back for stale runs and scores while it calibrates, but for its data', async () => {
    project = await soundRepository();
    await project.edit('model/control.txt', (text) => `${text}output daily\n`);
    const calibrating = await check(project.folder, '--phase', 'calibration');
    expect(calibrating.blocking.filter((one) => one.startsWith('seal.'))).toEqual([]);
    expect(calibrating.finding('seal.stale', 'runs.calibrated').level).toBe('warn');
    expect((await check(project.folder, '--phase', 'validation')).blocking).toContain(
      'seal.stale runs.calibrated',
    );

    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    expect((await check(project.folder, '--phase', 'calibration')).blocking).toContain(
      'seal.stale inputs.rainfall',
    );
    expect((await check(project.folder, '--phase', 'setup')).blocking).not.toContain(
      'seal.stale inputs.rainfall',
    );
  });
});
