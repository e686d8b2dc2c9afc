import { describe, expect, it } from 'vitest';
import { recordsOf, sealing, sealsFileOf } from '../../tests/records/in-memory.ts';
import { smallFiles, smallStudy } from '../../tests/records/small-study.ts';
import { followMoves } from './follow-moves.ts';
import type { Seal } from './seal.ts';
import { checksumOf } from './seal-entry.ts';
import { judgeStandings } from './standing.ts';

const { seals } = sealing(await recordsOf(smallStudy, smallFiles));

async function follow(text: string, files: Record<string, string>, from: ReadonlyMap<string, Seal> = seals) {
  const records = await recordsOf(text, files);
  const moved = followMoves(records, sealsFileOf(from));
  const standings = judgeStandings(records, sealsFileOf(moved.seals));
  const stale = [...standings.values()].filter(({ state }) => state !== 'sealed').map(({ record }) => record);
  for (const seal of moved.seals.values()) expect(seal.checksum).toBe(checksumOf(seal));
  return { ...moved, stale };
}

/** The small study's files with some called otherwise. */
function renamed(paths: Record<string, string>): Record<string, string> {
  return Object.fromEntries(Object.entries(smallFiles).map(([path, text]) => [paths[path] ?? path, text]));
}

describe('files that were renamed', () => {
  it('are followed below a pattern that still finds them, with person and date', async () => {
    const {
      files,
      stale,
      seals: now,
    } = await follow(smallStudy, renamed({ 'data/rain/high.csv': 'data/rain/upper.csv' }));
    expect(files).toEqual([
      { record: 'inputs.rainfall', from: 'data/rain/high.csv', to: 'data/rain/upper.csv' },
    ]);
    expect(stale).toEqual([]);
    expect(now.get('inputs.rainfall')).toMatchObject({
      sealed_by: 'Ada Weir <ada@northmere.example>',
      sealed_on: '2026-03-02',
    });
    expect(now.get('study')).toBe(seals.get('study'));
  });

  it('are followed where the manifest writes their path, in every record that does', async () => {
    const text = smallStudy
      .replaceAll('data/flow.csv', 'data/gauge/mill.csv')
      .replaceAll('bands/outlet.csv', 'bands/mill.csv');
    const { stale, files } = await follow(
      text,
      renamed({ 'data/flow.csv': 'data/gauge/mill.csv', 'bands/outlet.csv': 'bands/mill.csv' }),
    );
    expect(files.map(({ record }) => record)).toEqual(['inputs.flow', 'uncertainty']);
    expect(stale).toEqual([]);
  });

  it('are followed with their folder, also in patterns and in the run’s command', async () => {
    const text = smallStudy
      .replaceAll('runs/calibrated', 'outputs/base')
      .replaceAll('data/rain', 'data/precipitation')
      .replace('[node, model/run.mjs]', '[node, model/run.mjs, outputs/base]');
    const before = sealing(
      await recordsOf(
        smallStudy.replace('[node, model/run.mjs]', '[node, model/run.mjs, runs/calibrated]'),
        smallFiles,
      ),
    ).seals;
    const { stale } = await follow(
      text,
      renamed({
        'data/rain/high.csv': 'data/precipitation/high.csv',
        'data/rain/low.csv': 'data/precipitation/low.csv',
        'runs/calibrated/daily.csv': 'outputs/base/daily.csv',
      }),
      before,
    );
    expect(stale).toEqual([]);
  });

  it('leave stale what changed otherwise', async () => {
    const text = smallStudy
      .replaceAll('data/flow.csv', 'data/mill.csv')
      .replace('role: streamflow', 'role: other');
    const { stale, files } = await follow(text, renamed({ 'data/flow.csv': 'data/mill.csv' }));
    expect(files).toHaveLength(1);
    expect(stale).toContain('inputs.flow');
    expect(stale).not.toContain('inputs.rainfall');
    const other = await follow(smallStudy.replaceAll('data/flow.csv', 'data/mill.csv'), {
      ...renamed({ 'data/flow.csv': 'data/mill.csv' }),
      'data/mill.csv': 'other flow',
    });
    expect(other.files).toEqual([]);
    expect(other.stale).toContain('inputs.flow');
  });

  it('are said where nobody can tell which is which', async () => {
    const twins: Record<string, string> = {
      ...smallFiles,
      'data/rain/low.csv': smallFiles['data/rain/high.csv'] ?? '',
    };
    const before = sealing(await recordsOf(smallStudy, twins)).seals;
    const { 'data/rain/low.csv': low = '', 'data/rain/high.csv': high = '', ...rest } = twins;
    const { ambiguous, files, stale } = await follow(
      smallStudy,
      { ...rest, 'data/rain/a.csv': low, 'data/rain/b.csv': high },
      before,
    );
    expect(files).toEqual([]);
    expect(ambiguous).toEqual([
      {
        record: 'inputs.rainfall',
        from: ['data/rain/high.csv', 'data/rain/low.csv'],
        to: ['data/rain/a.csv', 'data/rain/b.csv'],
      },
    ]);
    expect(stale).toContain('inputs.rainfall');
  });

  it('do not count as such where a copy was made', async () => {
    const copy = { ...smallFiles, 'data/rain/copy.csv': smallFiles['data/rain/high.csv'] ?? '' };
    const { files, ambiguous, stale } = await follow(smallStudy, copy);
    expect([files, ambiguous]).toEqual([[], []]);
    expect(stale).toContain('inputs.rainfall');
  });
});

describe('records that were renamed', () => {
  it('are followed, in all that names them', async () => {
    const text = smallStudy
      .replace('  rainfall: {role', '  rain: {role')
      .replace('on: [rainfall, flow]', 'on: [rain, flow]')
      .replace('takes: [inputs.rainfall', 'takes: [inputs.rain')
      .replace('rain: {input: rainfall', 'rain: {input: rain');
    const files = renamed({ 'model/control.txt': 'model/settings.txt' });
    const {
      records,
      stale,
      seals: now,
    } = await follow(text.replaceAll('control.txt', 'settings.txt'), files);
    const drives = Object.keys(now.get('runs.calibrated')?.driven_by ?? {});
    expect(drives).toEqual(expect.arrayContaining(['inputs.rain', 'model/settings.txt']));
    expect(records).toEqual([{ from: 'inputs.rainfall', to: 'inputs.rain' }]);
    expect(now.has('inputs.rainfall')).toBe(false);
    expect(stale).toEqual([]);
  });

  it('are followed where a record names them that comes before', async () => {
    const text = smallStudy
      .replace('  check: {role', '  second: {role')
      .replaceAll('{input: check}', '{input: second}');
    const { records, stale } = await follow(text, smallFiles);
    expect(records).toEqual([{ from: 'inputs.check', to: 'inputs.second' }]);
    expect(stale).toEqual([]);
  });

  it('are followed together with their files', async () => {
    const text = smallStudy
      .replace('  calibrated:\n', '  base:\n')
      .replaceAll('run: calibrated', 'run: base')
      .replaceAll('runs/calibrated', 'runs/base')
      .replace('  outlet:\n', '  mill:\n')
      .replace('bands: {outlet:', 'bands: {mill:');
    const { records, stale } = await follow(
      text,
      renamed({ 'runs/calibrated/daily.csv': 'runs/base/daily.csv' }),
    );
    expect(records).toEqual([
      { from: 'runs.calibrated', to: 'runs.base' },
      { from: 'evaluation.outlet', to: 'evaluation.mill' },
    ]);
    expect(stale).toEqual([]);
  });

  it('are said where two would fit, and not taken for renamed where they state something else', async () => {
    const twins = smallStudy.replace(
      '  radar: {',
      '  copy: {role: precipitation, files: [data/check.csv]}\n  radar: {',
    );
    const before = sealing(await recordsOf(twins, smallFiles)).seals;
    const { records, ambiguous } = await follow(
      twins
        .replace('  copy:', '  first:')
        .replace('  check:', '  second:')
        .replaceAll('input: check', 'input: second'),
      smallFiles,
      before,
    );
    expect(records).toEqual([]);
    expect(ambiguous.map(({ record }) => record).sort()).toEqual(['inputs.first', 'inputs.second']);
    const other = await follow(
      smallStudy.replace('  radar: {role: precipitation', '  lidar: {role: terrain'),
      smallFiles,
    );
    expect(other.records).toEqual([]);
    expect(other.stale).toEqual(['inputs.lidar']);
  });
});

it('nothing moves where nothing was renamed', async () => {
  const { seals: now, files, records, ambiguous } = await follow(smallStudy, smallFiles);
  expect([files, records, ambiguous]).toEqual([[], [], []]);
  for (const [id, seal] of seals) expect(now.get(id)).toBe(seal);
});
