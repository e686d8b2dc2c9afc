import { afterEach, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
afterEach(() => project.remove());

describe('only prose is changed', () => {
  it('warns on the record itself and makes nothing stale', async () => {
    project = await soundRepository();
    await project.edit('stoplog.yaml', (text) =>
      text.replace('gauge stands in the open', 'the gauge stands in the open'),
    );
    const checked = await check(project.folder);
    expect(checked.status).toBe(0);
    expect(checked.found.filter((one) => one.startsWith('seal.'))).toEqual(['seal.reworded inputs.rainfall']);
    expect(checked.finding('seal.reworded', 'inputs.rainfall').level).toBe('warn');

    expect((await stoplog(project.folder, ['seal', 'inputs.rainfall'])).status).toBe(0);
    expect((await check(project.folder)).found.filter((one) => one.startsWith('seal.'))).toEqual([]);
  });
});
