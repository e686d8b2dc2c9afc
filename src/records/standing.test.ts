import { describe, expect, it } from 'vitest';
import { recordsFromData, recordsOf, sealing, sealsFileOf } from '../../tests/records/in-memory.ts';
import { smallFiles, smallStudy } from '../../tests/records/small-study.ts';
import type { FilesInMemory } from '../repository/memory.ts';
import type { Records } from './record.ts';
import { type Schemes, schemes } from './schemes.ts';
import type { Seal, Standing } from './seal.ts';
import { judgeStandings } from './standing.ts';

const sealedStudy = await recordsOf(smallStudy, smallFiles);
const { seals } = sealing(sealedStudy);

const judge = (records: Records, all: ReadonlyMap<string, Seal> = seals) =>
  judgeStandings(records, sealsFileOf(all));
const judged = async (text = smallStudy, files: FilesInMemory = smallFiles) =>
  judge(await recordsOf(text, files));
const inState = (standings: ReadonlyMap<string, Standing>, state: Standing['state']): string[] =>
  [...standings.values()].filter((one) => one.state === state).map(({ record }) => record);

describe('how records stand', () => {
  it('is unsealed before anybody looked, and sealed after all were sealed', async () => {
    expect(inState(judge(sealedStudy, new Map()), 'unsealed')).toHaveLength(sealedStudy.nodes.size);
    expect(inState(judge(sealedStudy), 'sealed')).toHaveLength(sealedStudy.nodes.size);
  });

  it('is stale for a changed file, and for all that rests on it, with the trail down to the file', async () => {
    const standings = await judged(smallStudy, { ...smallFiles, 'data/rain/high.csv': 'rain 9' });
    expect(inState(standings, 'stale').sort()).toEqual([
      'balance.catchment',
      'evaluation.outlet',
      'inputs.rainfall',
      'interventions',
      'parameters',
      'runs.calibrated',
      'runs.dry',
      'scenarios.dry',
      'uncertainty',
    ]);
    const path = 'data/rain/high.csv';
    expect(standings.get('inputs.rainfall')).toMatchObject({
      changes: [{ kind: 'file', path, was: { bytes: 6 }, now: { kind: 'file', bytes: 6 } }],
      trails: [{ steps: ['inputs.rainfall'], path }],
    });
    expect(standings.get('uncertainty')?.trails).toEqual([
      { steps: ['uncertainty', 'runs.calibrated', 'inputs.rainfall'], path },
    ]);
    // The scenario reaches rainfall directly (its conditions), by the dry run over the parameters, and by the calibrated run.
    expect(standings.get('scenarios.dry')?.trails).toEqual([
      { steps: ['scenarios.dry', 'inputs.rainfall'], path },
    ]);
  });

  it('names each of several roots once, the nearest first', async () => {
    const standings = await judged(smallStudy.replace('value: 180', 'value: 190'), {
      ...smallFiles,
      'runs/calibrated/daily.csv': 'new daily',
      'data/flow.csv': 'new flow',
    });
    expect(standings.get('balance.catchment')?.trails).toEqual([
      { steps: ['balance.catchment', 'runs.calibrated'], path: 'runs/calibrated/daily.csv' },
      { steps: ['balance.catchment', 'runs.calibrated', 'parameters'], path: null },
      { steps: ['balance.catchment', 'runs.calibrated', 'parameters', 'inputs.flow'], path: 'data/flow.csv' },
    ]);
    expect(standings.get('evaluation.outlet')?.trails[0]).toEqual({
      steps: ['evaluation.outlet', 'inputs.flow'],
      path: 'data/flow.csv',
    });
  });

  it('tells files added and removed from files changed', async () => {
    const { 'data/rain/low.csv': _, ...fewer } = smallFiles;
    const standings = await judged(smallStudy, { ...fewer, 'data/rain/new.csv': 'rain 3' });
    expect(standings.get('inputs.rainfall')?.changes).toMatchObject([
      { kind: 'file', path: 'data/rain/low.csv', was: { bytes: 6 }, now: null },
      { kind: 'file', path: 'data/rain/new.csv', was: null, now: { kind: 'file' } },
    ]);
  });

  it('ends a trail at a record that was sealed anew, or whose record is gone', async () => {
    const files = { ...smallFiles, 'data/future.csv': 'other future' };
    const records = await recordsOf(smallStudy, files);
    const later = sealing(records, seals, { wanted: ['inputs.future'] }).seals;
    expect(judge(records, later).get('runs.dry')?.trails).toEqual([
      { steps: ['runs.dry', 'inputs.future'], path: null },
    ]);
    const without = smallStudy.replace(/setup: .*\n/, '');
    expect((await judged(without)).get('parameters')).toMatchObject({
      changes: [{ kind: 'rests-on', id: 'setup', now: null }],
      trails: [{ steps: ['parameters', 'setup'], path: null }],
    });
  });

  it('leads through a field to what the field is about', async () => {
    const window = await judged(smallStudy.replace('2006-10-01/2009-09-30', '2007-10-01/2009-09-30'));
    expect(window.get('periods')?.trails).toEqual([{ steps: ['periods'], path: null }]);
    expect(window.get('uncertainty')?.trails).toEqual([
      { steps: ['uncertainty', 'periods.validation'], path: null },
    ]);
    expect(window.get('runs.calibrated')?.state).toBe('sealed');
    const settings = await judged(smallStudy, { ...smallFiles, 'model/reservoir.txt': 'release 4' });
    expect(settings.get('runs.dry')?.trails).toContainEqual({
      steps: ['runs.dry', 'interventions.settings'],
      path: 'model/reservoir.txt',
    });
  });

  it('is reworded where only prose changed, and stales nothing', async () => {
    const standings = await judged(smallStudy.replace('It fits the question.', 'It suits the question.'));
    expect(standings.get('model')).toMatchObject({ state: 'sealed', reworded: true });
    expect(inState(standings, 'stale')).toEqual([]);
    expect([...standings.values()].filter(({ reworded }) => reworded)).toHaveLength(1);
  });

  it('of a record in a circle is stale or unsealed, never sealed', async () => {
    const looped = smallStudy
      .replace('catchment: {name', 'catchment: {rests_on: [study], name')
      .replace('study: {id', 'study: {rests_on: [catchment], id');
    const standings = await judged(looped);
    expect(standings.get('study')).toMatchObject({ state: 'stale' });
    expect(standings.get('study')?.trails.length).toBeGreaterThan(0);
  });
});

describe('acceptances', () => {
  const accept = '{rule: evaluation.score-low, because: short record, by: A. Weir, on: 2026-02-01}';

  it('fall when what the record states, its files or what it rests on changes', async () => {
    const standings = await judged(smallStudy.replace('nse: 0.7}', 'nse: 0.6}'));
    expect(standings.get('evaluation.outlet')?.fallen).toEqual([0]);
    expect(
      (await judged(smallStudy, { ...smallFiles, 'data/flow.csv': 'x' })).get('evaluation.outlet')?.fallen,
    ).toEqual([0]);
  });

  it('count at once where they are new or renewed', async () => {
    const renewed = accept.replace('2026-02-01', '2026-03-01');
    const changed = smallStudy
      .replace('nse: 0.7}', 'nse: 0.6}')
      .replace(`[${accept}]`, `[${accept}, ${renewed}]`);
    expect((await judged(changed)).get('evaluation.outlet')?.fallen).toEqual([0]);
    const added = await judged(smallStudy.replace(`[${accept}]`, `[${accept}, ${renewed}]`));
    expect(added.get('evaluation.outlet')).toMatchObject({ state: 'sealed', reworded: false, fallen: [] });
  });
});

describe('an upgrade', () => {
  // A scheme of the future that finds that a water balance rests on the catchment's area.
  const upgraded: Schemes = [
    ...schemes,
    {
      number: 2,
      restsOn: (statement, stated) => [
        ...schemes[0].restsOn(statement, stated),
        ...(statement.area === 'balance'
          ? [{ to: 'catchment', written: 'catchment', field: statement.field }]
          : []),
      ],
    },
  ];
  const recordsAfter = (text = smallStudy) => recordsOf(text, smallFiles, { schemes: upgraded });

  it('makes nothing stale: a seal is judged by the scheme that it was made with', async () => {
    const records = await recordsAfter();
    expect(records.nodes.get('balance.catchment')?.restsOn).toContain('catchment');
    const standings = judgeStandings(records, sealsFileOf(seals), upgraded);
    expect(inState(standings, 'sealed')).toHaveLength(records.nodes.size);
    expect([...standings.values()].every(({ oldScheme }) => oldScheme)).toBe(true);
  });

  it('still finds what changed by the old scheme, and only that', async () => {
    const standings = judgeStandings(
      await recordsAfter(smallStudy.replace('value: 12', 'value: 13')),
      sealsFileOf(seals),
      upgraded,
    );
    expect(inState(standings, 'stale')).toEqual(['catchment']);
  });

  it('is followed by sealing again, record by record', async () => {
    const { seals: later } = sealing(
      await recordsAfter(),
      seals,
      { wanted: ['balance.catchment'] },
      upgraded,
    );
    expect(later.get('balance.catchment')).toMatchObject({
      scheme: 2,
      rests_on: { catchment: expect.any(String) },
    });
    expect(later.get('catchment')).toBe(seals.get('catchment'));
    const standings = judgeStandings(
      await recordsAfter(smallStudy.replace('value: 12', 'value: 13')),
      sealsFileOf(later),
      upgraded,
    );
    expect(inState(standings, 'stale')).toEqual(['catchment', 'balance.catchment']);
  });
});

describe('many records above one file', () => {
  it('are stale each with the root named once', async () => {
    const names = Array.from({ length: 300 }, (_, index) => `r${index}`);
    const data = (names: readonly string[]) => ({
      stoplog: 1 as const,
      inputs: { rainfall: { files: ['rain.csv'] } },
      runs: Object.fromEntries(
        names.map((name, index) => [
          name,
          { takes: ['inputs.rainfall', ...(index > 0 ? [`runs.r${index - 1}`] : [])] },
        ]),
      ),
    });
    const before = await recordsFromData(data(names), { 'rain.csv': '1' });
    const standings = judge(await recordsFromData(data(names), { 'rain.csv': '2' }), sealing(before).seals);
    for (const name of names) {
      expect(standings.get(`runs.${name}`)?.trails).toEqual([
        { steps: [`runs.${name}`, 'inputs.rainfall'], path: 'rain.csv' },
      ]);
    }
  });
});
