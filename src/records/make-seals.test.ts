import { describe, expect, it } from 'vitest';
import { recordsOf, sealing, sealsFileOf } from '../../tests/records/in-memory.ts';
import { smallFiles, smallStudy } from '../../tests/records/small-study.ts';
import { readManifest } from '../manifest/read.ts';
import { snapshotFromMemory } from '../repository/memory.ts';
import { buildRecords } from './build.ts';
import type { Seal } from './seal.ts';
import { checksumOf } from './seal-entry.ts';
import { readSealsFile, writeSealsFile } from './seals-file.ts';
import { judgeStandings } from './standing.ts';

const records = await recordsOf(smallStudy, smallFiles);
const { seals } = sealing(records);
const later = { person: 'Ben Leat <ben@northmere.example>', today: '2026-05-01' };
const reseal = async (
  files: Record<string, string>,
  request: Parameters<typeof sealing>[2] = {},
  text = smallStudy,
) => sealing(await recordsOf(text, { ...smallFiles, ...files }), seals, { ...later, ...request });

describe('sealing', () => {
  it('keeps who, when, the content and nothing else', () => {
    const seal = seals.get('runs.calibrated') as Seal;
    expect(seal).toMatchObject({
      scheme: 1,
      sealed_by: 'Ada Weir <ada@northmere.example>',
      sealed_on: '2026-03-02',
      grade: 'sealed',
      because: null,
      unmoved: [],
      facts: {},
      digest: records.nodes.get('runs.calibrated')?.digest,
      substance: records.nodes.get('runs.calibrated')?.substance,
    });
    expect(Object.keys(seal.files)).toEqual(['model/control.txt', 'runs/calibrated/daily.csv']);
    expect(seal.rests_on['inputs.rainfall']).toBe(records.nodes.get('inputs.rainfall')?.digest);
    expect(seal.checksum).toBe(checksumOf(seal));
  });

  it('writes paths as the manifest’s folder sees them', async () => {
    const below = Object.fromEntries(
      Object.entries(smallFiles).map(([path, text]) => [`mill/${path}`, text]),
    );
    const { seals: there } = sealing(await recordsOf(smallStudy, below, { path: 'mill/stoplog.yaml' }));
    expect(writeSealsFile(there)).toBe(writeSealsFile(seals));
  });

  it('seals first what a record rests on and is not sound, and says so', () => {
    const plan = sealing(records, new Map(), { wanted: ['evaluation.outlet'] });
    const order = plan.sealed.map(({ record, along }) => `${record}${along ? ' along' : ''}`);
    expect(order.at(-1)).toBe('evaluation.outlet');
    expect(order.slice(0, -1).sort()).toEqual(
      ['inputs.flow', 'inputs.rainfall', 'model', 'parameters', 'periods', 'runs.calibrated', 'setup'].map(
        (id) => `${id} along`,
      ),
    );
    expect(order.indexOf('inputs.rainfall along')).toBeLessThan(order.indexOf('parameters along'));
    expect(sealing(records, plan.seals, { wanted: ['evaluation.outlet'] }).sealed).toEqual([]);
  });

  it('takes an area or a repeated record for all its records', () => {
    const plan = sealing(records, new Map(), { wanted: ['inputs'] });
    expect(plan.sealed.map(({ record }) => record).sort()).toEqual(
      ['check', 'flow', 'future', 'radar', 'rainfall'].map((name) => `inputs.${name}`),
    );
  });

  it('keeps every seal that still fits, byte for byte', async () => {
    const plan = await reseal({ 'data/check.csv': 'check 2' }, { wanted: ['inputs.check'] });
    expect(plan.sealed.map(({ record, before }) => [record, before])).toEqual([
      ['inputs.check', seals.get('inputs.check')],
    ]);
    for (const [id, seal] of seals) if (id !== 'inputs.check') expect(plan.seals.get(id)).toBe(seal);
    const again = sealing(records, seals, later);
    expect(again.sealed).toEqual([]);
    expect(writeSealsFile(again.seals)).toBe(writeSealsFile(seals));
  });

  it('renews the seal of a reworded record, or one with a new acceptance, where that is asked for', async () => {
    const reworded = smallStudy
      .replace('It fits the question.', 'It suits.')
      .replace(
        'by: A. Weir, on: 2026-02-01}',
        'by: A. Weir, on: 2026-02-01}, {rule: evaluation.drop, by: A. Weir, on: 2026-04-01}',
      );
    expect((await reseal({}, {}, reworded)).sealed.map(({ record }) => record).sort()).toEqual([
      'evaluation.outlet',
      'model',
    ]);
    expect((await reseal({}, { wanted: ['runs.calibrated'] }, reworded)).sealed).toEqual([]);
  });

  it('takes facts and grade from the evidence, and renews a seal for a better grade', () => {
    const evidence = new Map([
      ['evaluation.outlet', { facts: { nse: { value: 0.7, computed_by: 1 } }, grade: 'recomputed' as const }],
    ]);
    const plan = sealing(records, seals, { ...later, evidence });
    expect(plan.sealed.map(({ seal }) => [seal.grade, seal.facts, seal.sealed_on])).toEqual([
      ['recomputed', { nse: { value: 0.7, computed_by: 1 } }, '2026-05-01'],
    ]);
    expect(sealing(records, plan.seals, { evidence }).sealed).toEqual([]);
  });

  it('drops the seals of records that are gone only where all is sealed', async () => {
    const without = smallStudy
      .replace(/ {2}future: .*\n/, '')
      .replaceAll(/inputs\.future, |rain: \{input: future\}, /g, '');
    expect((await reseal({}, { wanted: ['study'] }, without)).dropped).toEqual([]);
    const plan = await reseal({}, { because: 'The storyline was left out.' }, without);
    expect(plan.dropped).toEqual(['inputs.future']);
    expect(plan.seals.has('inputs.future')).toBe(false);
  });

  it('says which files could not be verified', async () => {
    const { manifest } = readManifest('stoplog.yaml', smallStudy);
    if (manifest === null) throw new Error('The small study has faults.');
    const memory = snapshotFromMemory(smallFiles);
    const partial = await buildRecords(manifest, {
      ...memory,
      identify: async (paths) => {
        const all = new Map(await memory.identify(paths));
        return all.set('data/flow.csv', { kind: 'unavailable', why: 'not-fetched', blob: 'a1' });
      },
    });
    const [flow] = sealing(partial, new Map(), { wanted: ['inputs.flow'] }).sealed;
    expect(flow?.unverified).toEqual(['data/flow.csv']);
    expect(flow?.seal.files['data/flow.csv']).toEqual({ sha256: null, bytes: null, blob: 'a1' });
  });
});

describe('refusals', () => {
  const refusals = ({ refused }: ReturnType<typeof sealing>) =>
    refused.map(({ record, reason }) => [record, reason]);

  it('of a run whose input changed while its outputs did not, and of all above it', async () => {
    const plan = await reseal({ 'data/future.csv': 'future 2' });
    expect(refusals(plan)).toEqual([
      ['runs.dry', 'unmoved'],
      ['scenarios.dry', 'rests-on-refused'],
    ]);
    expect(plan.sealed.map(({ record }) => record)).toEqual(['inputs.future']);
    expect(plan.seals.get('runs.dry')).toBe(seals.get('runs.dry'));
    expect(plan.refused[1]).toMatchObject({ root: 'runs.dry', next: 'Clear runs.dry first.' });
    expect(plan.refused[0]).toMatchObject({
      message: expect.stringContaining('inputs.future changed since runs.dry was sealed'),
      next: expect.stringContaining('Repeat the run'),
    });
  });

  it('of a run whose control file changed while its outputs did not', async () => {
    expect(refusals(await reseal({ 'model/control.txt': 'warmup 3' }, { wanted: ['runs'] }))).toEqual([
      ['runs.calibrated', 'unmoved'],
    ]);
  });

  it('not where the outputs changed too', async () => {
    const plan = await reseal({ 'data/future.csv': 'future 2', 'runs/dry/daily.csv': 'dry daily 2' });
    expect(refusals(plan)).toEqual([]);
    expect(plan.seals.get('runs.dry')).toMatchObject({ unmoved: [], because: null });
  });

  it('not with a reason, which is kept with what it is about, and only there', async () => {
    const because = 'Only the header of the file changed.';
    const plan = await reseal({ 'data/future.csv': 'future 2' }, { because });
    expect(refusals(plan)).toEqual([]);
    expect(plan.seals.get('runs.dry')).toMatchObject({
      because,
      unmoved: ['inputs.future'],
      grade: 'sealed',
    });
    expect(plan.seals.get('inputs.future')?.because).toBeNull();
    expect(plan.seals.get('scenarios.dry')?.because).toBeNull();
  });

  it('not where a rerun gave the same outputs', async () => {
    const evidence = new Map([['runs.dry', { facts: {}, grade: 'rerun' as const }]]);
    const plan = await reseal({ 'data/future.csv': 'future 2' }, { evidence });
    expect(plan.seals.get('runs.dry')).toMatchObject({
      grade: 'rerun',
      because: null,
      unmoved: ['inputs.future'],
    });
  });

  it('of parameters whose calibration data or window changed while their values did not', async () => {
    expect(refusals(await reseal({ 'data/flow.csv': 'flow 2' }, { wanted: ['parameters'] }))).toEqual([
      ['parameters', 'unmoved'],
    ]);
    const window = smallStudy.replace('2003-10-01/2006-09-30', '2004-10-01/2006-09-30');
    expect(refusals(await reseal({}, { wanted: ['parameters'] }, window))).toEqual([
      ['parameters', 'unmoved'],
    ]);
    const calibrated = smallStudy.replace('value: 180', 'value: 181');
    expect(
      refusals(await reseal({ 'data/flow.csv': 'flow 2' }, { wanted: ['parameters'] }, calibrated)),
    ).toEqual([]);
    // A new value beside other changes of the statement is still the old calibration where the value is the same.
    const relabelled = smallStudy.replace('algorithm: search', 'algorithm: local search');
    expect(
      refusals(await reseal({ 'data/flow.csv': 'flow 2' }, { wanted: ['parameters'] }, relabelled)),
    ).toEqual([['parameters', 'unmoved']]);
  });

  it('not of a run where only what is said of its data changed', async () => {
    const said = smallStudy.replace(
      'files: [data/future.csv]',
      'files: [data/future.csv], period: 2041-10-01/2049-09-30',
    );
    expect(refusals(await reseal({}, {}, said))).toEqual([]);
  });

  it('not of a run above parameters that a reason was given for: their values are what it takes', async () => {
    const plan = await reseal(
      { 'data/flow.csv': 'flow 2' },
      { wanted: ['parameters'], because: 'Two gaps were filled.' },
    );
    const next = await recordsOf(smallStudy, { ...smallFiles, 'data/flow.csv': 'flow 2' });
    expect(refusals(sealing(next, plan.seals, { wanted: ['runs'] }))).toEqual([]);
    expect(
      refusals(await reseal({}, { wanted: ['runs.dry'] }, smallStudy.replace('value: 180', 'value: 190'))),
    ).toEqual([['runs.dry', 'unmoved']]);
  });

  it('not of a run for which something was newly recorded', async () => {
    const bare = smallStudy.replace(/setup: .*\n/, '');
    const young = sealing(await recordsOf(bare, smallFiles)).seals;
    expect(refusals(sealing(records, young, later)).filter(([, reason]) => reason === 'unmoved')).toEqual([]);
  });

  it('of a record with an acceptance that has fallen, until it is renewed or deleted', async () => {
    const lower = smallStudy.replace('nse: 0.7}', 'nse: 0.6}');
    const plan = await reseal({}, {}, lower);
    expect(refusals(plan)).toEqual([
      ['evaluation.outlet', 'fallen-acceptance'],
      ['uncertainty', 'rests-on-refused'],
      ['scenarios.dry', 'rests-on-refused'],
    ]);
    expect(plan.refused.map(({ root }) => root)).toEqual([
      undefined,
      'evaluation.outlet',
      'evaluation.outlet',
    ]);
    expect(refusals(await reseal({}, {}, lower.replace('on: 2026-02-01', 'on: 2026-05-01')))).toEqual([]);
    expect(refusals(await reseal({}, {}, lower.replace(/ {4}accepts: .*\n/, '')))).toEqual([]);
  });

  it('of a record with a path that names nothing', async () => {
    const { 'data/flow.csv': _, ...fewer } = smallFiles;
    const plan = sealing(await recordsOf(smallStudy, fewer), seals, later);
    expect(refusals(plan)[0]).toEqual(['inputs.flow', 'no-file']);
    const { 'model/control.txt': __, ...noControl } = smallFiles;
    const reading = sealing(await recordsOf(smallStudy, noControl), new Map(), { wanted: ['periods'] });
    expect(refusals(reading)).toEqual([]);
  });

  it('of a record in or above a circle', async () => {
    const looped = smallStudy
      .replace('catchment: {name', 'catchment: {rests_on: [study], name')
      .replace('study: {id', 'study: {rests_on: [catchment], id');
    expect(refusals(sealing(await recordsOf(looped, smallFiles)))).toEqual([
      ['catchment', 'circle'],
      ['study', 'circle'],
    ]);
  });

  it('of a name that no record has', () => {
    const plan = sealing(records, seals, { wanted: ['inputs.rainfal'] });
    expect(plan.refused).toMatchObject([
      { record: 'inputs.rainfal', reason: 'unknown-record', next: 'The nearest is inputs.rainfall.' },
    ]);
  });

  it('of everything while the seals file can’t be read in whole', () => {
    for (const text of ['{', '{"records": 1}', '<<<<<<< HEAD\n{}\n=======\n>>>>>>> other\n']) {
      const sealsFile = readSealsFile('stoplog.seals.json', text);
      const plan = sealing(records, new Map(), { sealsFile });
      expect(refusals(plan)).toEqual([['stoplog.seals.json', 'unreadable-seals']]);
      expect(plan.sealed).toEqual([]);
    }
  });
});

describe('an entry that was edited by hand', () => {
  const edited = readSealsFile(
    'stoplog.seals.json',
    writeSealsFile(seals).replace(`"outcome": "${seals.get('runs.dry')?.outcome}"`, `"outcome": null`),
  );

  it('does not count as a seal', () => {
    expect(edited.faults.map(({ kind, record }) => [kind, record])).toEqual([['edited', 'runs.dry']]);
    expect(judgeStandings(records, edited).get('runs.dry')?.state).toBe('unsealed');
  });

  it('is made anew, or stays as it is until it is', () => {
    const request = { sealsFile: edited, standings: judgeStandings(records, edited) };
    expect(sealing(records, new Map(), { ...request, wanted: ['runs.dry'] })).toMatchObject({
      dropped: [],
      sealed: [{ record: 'runs.dry' }],
    });
    const other = sealing(records, new Map(), { ...request, wanted: ['study'] });
    expect(other).toMatchObject({ dropped: [], unreadable: edited.unreadable });
    expect([...other.unreadable.keys()]).toEqual(['runs.dry']);
  });

  it('goes with the others where its record is gone and all is sealed', async () => {
    const without = smallStudy
      .replace(/ {2}future: .*\n/, '')
      .replaceAll(/inputs\.future, |rain: \{input: future\}, /g, '');
    const now = await recordsOf(without, smallFiles);
    const sealsFile = { ...sealsFileOf(seals), unreadable: new Map([['inputs.future', 1]]) };
    const standings = judgeStandings(now, sealsFile);
    const plan = (wanted: 'all' | string[]) =>
      sealing(now, new Map(), { sealsFile, standings, wanted, because: 'It was left out.' });
    expect([...plan('all').unreadable]).toEqual([]);
    expect(plan(['study']).dropped).toEqual([]);
  });
});
