import { afterEach, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
afterEach(() => project.remove());

/** The simulated flow of one day, a little higher. */
function higherFlow(table: string): string {
  const [header = '', ...rows] = table.split('\n');
  const column = header.split(',').indexOf('flow_m3s');
  return [
    header,
    ...rows.map((row) => {
      if (!row.startsWith('2005-01-0')) return row;
      const cells = row.split(',');
      cells[column] = String(Number(cells[column]) + 0.001);
      return cells.join(',');
    }),
  ].join('\n');
}

describe('model rerun, outputs new', () => {
  it('asks for another look at the graph, and is content when somebody has looked', async () => {
    project = await soundRepository();
    await project.edit('runs/calibrated/daily.csv', higherFlow);
    expect((await check(project.folder)).state('runs.calibrated')).toBe('stale');

    expect((await stoplog(project.folder, ['seal', '--all'])).status).toBe(0);
    const unseen = await check(project.folder);
    expect(unseen.blocking).toContain('evaluation.unseen evaluation.outlet-flow');
    expect(unseen.blocking.filter((one) => one.startsWith('seal.'))).toEqual([]);

    await project.edit('stoplog.yaml', (text) => text.replace('on: 2021-01-15', 'on: 2021-03-01'));
    expect((await stoplog(project.folder, ['seal', 'evaluation.outlet-flow'])).status).toBe(0);
    expect((await check(project.folder)).blocking).not.toContain('evaluation.unseen evaluation.outlet-flow');
  });
});
