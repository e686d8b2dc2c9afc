import { afterEach, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
afterEach(() => project.remove());

/** 2 m3/s more on nine days. */
const higherFlow = (table: string): string => {
  const [header = '', ...rows] = table.split('\n');
  const column = header.split(',').indexOf('flow_m3s');
  const raised = (row: string) =>
    row.split(',').map((cell, place) => (place === column ? String(Number(cell) + 2) : cell));
  return [header, ...rows.map((row) => (row.startsWith('2005-01-0') ? raised(row).join(',') : row))].join(
    '\n',
  );
};

describe('a change that was sealed anew', () => {
  it('tells a reviewer what moved in data and scores, though nothing is left to clear in them', async () => {
    project = await soundRepository();
    await project.edit('data/rain.csv', moreRain('2005-01-01'));
    await project.edit('runs/calibrated/daily.csv', higherFlow);
    await project.edit('stoplog.yaml', (text) =>
      text.replace('Recessions are', 'Recessions of all years are'),
    );
    const sealed = await stoplog(project.folder, ['seal', '--all', '--because', 'an invented storm']);
    expect(sealed.status).toBe(0);
    await project.commit();

    const { verdict, found } = await check(project.folder, '--base', 'HEAD~1');
    expect(found).not.toContain('seal.stale inputs.rainfall');
    const changed = new Map(verdict.manifests[0]?.changed.map(({ record, what }) => [record, what]));
    // One day has 20 mm more; nine days 2 m3/s more.
    expect(changed.get('inputs.rainfall')?.[0]).toMatch(
      /^1 of [\d ]+ values differ; .* mm .*, on 2005-01-01$/,
    );
    expect(changed.get('runs.calibrated')?.[0]).toMatch(
      /^9 of [\d ]+ values differ; .*, 2005-01-01 to 2005-01-09$/,
    );
    expect(changed.get('evaluation.outlet-flow')).toContainEqual(
      expect.stringMatching(/\bnse [\d.-]+ -> [\d.-]+$/),
    );
    expect(changed.has('model')).toBe(false);
    // What somebody saw is kept as a fingerprint, which tells a reader nothing.
    expect([...changed.values()].flat().join('\n')).not.toMatch(/[0-9a-f]{40}/);

    const comment = (await stoplog(project.folder, ['check', '--base', 'HEAD~1', '--report', 'markdown']))
      .text;
    expect(comment).toMatch(/### What changed in data and figures\n(?:.*\n)*?\| inputs\.rainfall \| 1 of /);
    expect(comment).toMatch(/\| evaluation\.outlet-flow \| .*nse [\d.-]+ -&gt; /);

    const only = await check(project.folder, '--base', 'HEAD~1', '--only', 'inputs');
    expect(only.verdict.manifests[0]?.changed.map(({ record }) => record)).toEqual(['inputs.rainfall']);
  });

  it('is not told where nothing is compared, or nothing moved', async () => {
    project = await soundRepository();
    await project.write('README.md', 'Read me.\n');
    await project.commit();
    for (const words of [[], ['--base', 'HEAD~1']])
      expect((await check(project.folder, ...words)).verdict.manifests[0]?.changed).toEqual([]);
  });
});
