import { afterEach, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
afterEach(() => project.remove());

it('writes the figures of balance and band that a new run gives, and is content with them', async () => {
  project = await soundRepository();
  // Everything that flows out is less by a tenth in the last year, and so is the band.
  const tenthLess = (columns: readonly number[]) => (text: string) =>
    text.replace(/^20(?:09-1[0-2]|10-).*$/gm, (row) =>
      row
        .split(',')
        .map((cell, place) => (columns.includes(place) ? (Number(cell) * 0.9).toFixed(4) : cell))
        .join(','),
    );
  await project.edit('runs/calibrated/daily.csv', tenthLess([4]));
  await project.edit('runs/calibrated/band.csv', tenthLess([1, 2]));
  const stale = (await check(project.folder)).blocking;
  expect(stale).toEqual(
    expect.arrayContaining(['balance.differs balance.catchment', 'uncertainty.differs uncertainty']),
  );

  const { text } = await stoplog(project.folder, ['seal', '--all', '--figures']);
  expect(text).toContain('balance.catchment.stated.runoff_ratio');
  expect(text).toContain('uncertainty.bands.outlet-flow.stated.coverage');
  const manifest = await project.read('stoplog.yaml');
  expect(manifest).toMatch(/stated: \{ residual_share: 0\.\d{4}, runoff_ratio: 0\.46\d \}/);
  expect(manifest).toMatch(/stated: \{ coverage: 0\.\d\d, relative_width: 0\.\d\d \}/);
  expect((await check(project.folder)).blocking.filter((one) => one.includes('.differs'))).toEqual([]);
});

it('writes the score that tells of the low flows which the purpose needs', async () => {
  project = await soundRepository();
  await project.edit('stoplog.yaml', (text) => text.replaceAll(/, log_nse: [0-9.]+/g, ''));
  expect((await check(project.folder)).blocking).toContain('evaluation.need-unscored evaluation.outlet-flow');
  const { text } = await stoplog(project.folder, ['seal', 'evaluation.outlet-flow', '--figures']);
  expect(text).toMatch(/evaluation\.outlet-flow\.scores\.validation\.log_nse {3}nothing -> 0\.\d\d/);
  expect((await check(project.folder)).found).not.toContain(
    'evaluation.need-unscored evaluation.outlet-flow',
  );

  // Windows without any score get it among the usual ones.
  await project.edit('stoplog.yaml', (text) =>
    text.replace(/^( {4}scores:)\n {6}calibration:.*\n {6}validation:.*\n/m, ''),
  );
  await stoplog(project.folder, ['seal', 'evaluation.outlet-flow', '--figures']);
  expect((await check(project.folder)).found).not.toContain(
    'evaluation.need-unscored evaluation.outlet-flow',
  );
  // A figure says by its decimals how exact it is: 1 would also be said of 0.6.
  const target = /\n {2}outlet-flow:[\s\S]*?(?=\n {2}\S)/.exec(await project.read('stoplog.yaml'))?.[0] ?? '';
  expect(target.match(/(?<=(nse|pbias|r2|kge): )[-\d.]+/g)?.length).toBeGreaterThan(8);
  for (const written of target.match(/(?<=(nse|pbias|r2|kge): )[-\d.]+/g) ?? [])
    expect(written).toMatch(/\.\d\d$/);
});

it('says why no score can be computed, as the check does', async () => {
  project = await soundRepository();
  await project.edit('stoplog.yaml', (text) =>
    text
      .replace(/^( {4}scores:)\n {6}calibration:.*\n {6}validation:.*\n/m, '')
      .replace(/^ {2}(?:calibration|validation): \[.*\n/gm, ''),
  );
  const { text } = await stoplog(project.folder, ['seal', 'evaluation.outlet-flow', '--figures']);
  expect(text).toMatch(
    /NO SCORES could be computed\n {2}evaluation\.outlet-flow\n {5}no calibration window is stated\./,
  );
  const { verdict } = await check(project.folder);
  const told = verdict.manifests[0]?.findings.find(({ rule }) => rule === 'evaluation.missing');
  expect(told?.message).toContain('nor can they be computed: no calibration window is stated.');
  expect(told?.clear).toMatch(/^Clear that first\. Then/);
});
