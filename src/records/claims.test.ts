import { describe, expect, it } from 'vitest';
import { recordsOf } from '../../tests/records/in-memory.ts';
import { smallFiles, smallStudy } from '../../tests/records/small-study.ts';
import { readManifest } from '../manifest/read.ts';
import { snapshotFromMemory } from '../repository/memory.ts';
import type { FileIdentity, Snapshot } from '../repository/snapshot.ts';
import { buildRecords } from './build.ts';
import type { Records } from './record.ts';

const claimsOf = ({ nodes }: Records, id: string): Record<string, boolean> =>
  Object.fromEntries([...(nodes.get(id)?.claims.values() ?? [])].map(({ path, own }) => [path, own]));

async function recordsIn(text: string, snapshot: Partial<Snapshot>): Promise<Records> {
  const { manifest } = readManifest('stoplog.yaml', text);
  if (manifest === null) throw new Error('The manifest of the test has faults.');
  return buildRecords(manifest, { ...snapshotFromMemory({}), ...snapshot });
}

describe('files that records depend on', () => {
  it('are its own where it is their home', async () => {
    const records = await recordsOf(smallStudy, smallFiles);
    expect(claimsOf(records, 'model')).toEqual({ 'model/run.mjs': true });
    expect(claimsOf(records, 'inputs.rainfall')).toEqual({
      'data/rain/high.csv': true,
      'data/rain/low.csv': true,
      'data/prepare.mjs': false,
    });
    expect(claimsOf(records, 'parameters')).toEqual({ 'calibration/sensitivity.csv': true });
    expect(claimsOf(records, 'runs.calibrated')).toEqual({
      'model/control.txt': false,
      'runs/calibrated/daily.csv': true,
    });
    expect(claimsOf(records, 'interventions')).toEqual({
      'model/reservoir.txt': true,
      'model/unused.txt': true,
    });
  });

  it('are left to the run that gives them', async () => {
    const records = await recordsOf(smallStudy, smallFiles);
    for (const id of ['evaluation.outlet', 'balance.catchment', 'scenarios.dry']) {
      expect(claimsOf(records, id)).toEqual({});
    }
  });

  it('are read where the named run does not give them', async () => {
    const other = smallStudy.replace(
      'catchment: {run: calibrated, file: runs/calibrated/daily.csv}',
      'catchment: {run: calibrated, file: runs/dry/daily.csv}',
    );
    const records = await recordsOf(other, smallFiles);
    expect(claimsOf(records, 'balance.catchment')).toEqual({ 'runs/dry/daily.csv': false });
    expect(claimsOf(records, 'uncertainty')).toEqual({ 'bands/outlet.csv': false });
  });

  it('are not those that a reading looks at, which still count as named', async () => {
    const records = await recordsOf(smallStudy, smallFiles);
    expect(claimsOf(records, 'periods')).toEqual({});
    expect(records.unaccounted).toEqual([]);
  });

  it('carry the field that names them and what they are', async () => {
    const { nodes } = await recordsOf(smallStudy, smallFiles);
    expect(nodes.get('runs.calibrated')?.claims.get('runs/calibrated/daily.csv')).toMatchObject({
      field: ['runs', 'calibrated', 'gives', 0],
      // GNU coreutils 9.1: printf daily | sha256sum; git 2.39: printf daily | git hash-object --stdin
      identity: {
        kind: 'file',
        bytes: 5,
        sha256: '6f31304cdfd0a3a6362bffbc6dc4f33ecb20221b84f79cf0137b7dc0f5d3a616',
        blob: '0bdb597ac766f0eab78698feb2c9342a4ec6a6f5',
      },
    });
  });

  it('may be kept elsewhere, also the outputs of a run that others read', async () => {
    const text = `stoplog: 1
runs:
  big: {stored: elsewhere, gives: [{path: runs/big.nc, sha256: ${'b'.repeat(64)}}, runs/log.txt, runs/big.json]}
evaluation:
  outlet: {simulated: {run: big, file: runs/big.nc}}
`;
    const records = await recordsOf(text, { 'runs/log.txt': 'ended' });
    const { nodes, unmatched } = records;
    expect(claimsOf(records, 'runs.big')).toEqual({ 'runs/log.txt': true });
    expect(nodes.get('runs.big')?.elsewhere).toEqual([
      {
        path: 'runs/big.nc',
        sha256: 'b'.repeat(64),
        bytes: undefined,
        location: undefined,
        field: ['runs', 'big', 'gives', 0],
      },
      {
        path: 'runs/big.json',
        sha256: undefined,
        bytes: undefined,
        location: undefined,
        field: ['runs', 'big', 'gives', 2],
      },
    ]);
    expect(unmatched).toEqual([]);
  });
});

describe('paths that name nothing usable', () => {
  const text = (path: string) => `stoplog: 1
inputs: {rainfall: {files: [${JSON.stringify(path)}]}}
`;

  it('match no tracked file; what lies on disk untracked is named', async () => {
    const { unmatched } = await recordsIn(text('data/*.csv'), { untracked: ['data/a.csv', 'notes.txt'] });
    expect(unmatched).toEqual([
      {
        record: 'inputs.rainfall',
        pattern: 'data/*.csv',
        field: ['inputs', 'rainfall', 'files', 0],
        why: 'no-match',
        untracked: ['data/a.csv'],
        ignored: [],
      },
    ]);
  });

  it.each(['../rain.csv', '/data/rain.csv', 'C:\\rain.csv'])('leave the repository: %s', async (path) => {
    const { unmatched } = await recordsOf(text(path), {});
    expect(unmatched).toMatchObject([{ pattern: path, why: 'outside-repository', untracked: [] }]);
  });

  it('leave it through a link, also one among several files', async () => {
    const files = {
      'data/a.csv': '1',
      'data/out.csv': { link: '../../rain.csv' },
      far: { link: '/srv/data' },
    };
    const { unmatched, nodes } = await recordsOf(text('data/*.csv'), files);
    expect(unmatched).toMatchObject([{ why: 'outside-repository' }]);
    expect([...(nodes.get('inputs.rainfall')?.claims.keys() ?? [])]).toEqual(['data/a.csv']);
    expect((await recordsOf(text('far/rain.csv'), files)).unmatched).toMatchObject([
      { why: 'outside-repository' },
    ]);
  });

  it('do not include a path through a link inside the repository', async () => {
    const files = { 'store/rain.csv': '1', data: { link: 'store' } };
    const { unmatched, nodes } = await recordsOf(text('data/rain.csv'), files);
    expect(unmatched).toEqual([]);
    expect(nodes.get('inputs.rainfall')?.claims.get('data/rain.csv')?.identity.kind).toBe('file');
  });

  it('include the manifest and its seals, whatever names them', async () => {
    const files = { 'stoplog.seals.json': '{}', 'data/a.csv': '1' };
    expect((await recordsOf(text('stoplog.seals.json'), files)).unmatched).toMatchObject([
      { why: 'no-match' },
    ]);
    const { nodes } = await recordsOf(text('**'), files);
    expect([...(nodes.get('inputs.rainfall')?.claims.keys() ?? [])]).toEqual(['data/a.csv']);
  });

  it('are reported of a reading and of `covers` too', async () => {
    const { unmatched } = await recordsOf(
      `stoplog: 1
model: {release: "1"}
readings: [{of: model.release, file: run.log, take: {key: release}}]
covers: [../**]
`,
      {},
    );
    expect(unmatched).toMatchObject([
      { record: 'model', pattern: 'run.log', field: ['readings', 0, 'file'], why: 'no-match' },
      { record: 'manifest', pattern: '../**', field: ['covers', 0], why: 'outside-repository' },
    ]);
  });
});

describe('content that could not be verified', () => {
  it('enters the digest as null', async () => {
    const text = `stoplog: 1
inputs: {rainfall: {files: [rain.csv]}}
`;
    const unavailable: FileIdentity = { kind: 'unavailable', why: 'unmerged', blob: null };
    const { nodes } = await recordsIn(text, {
      unmerged: ['rain.csv'],
      identify: async (paths) => new Map([...paths].map((path) => [path, unavailable])),
    });
    const node = nodes.get('inputs.rainfall');
    expect(node?.claims.get('rain.csv')?.identity).toEqual(unavailable);
    const available = (await recordsOf(text, { 'rain.csv': '1' })).nodes.get('inputs.rainfall');
    expect(node?.digest).not.toBe(available?.digest);
  });
});

describe('files that no record names', () => {
  it('are those under `covers` that are not left out', async () => {
    const more = {
      ...smallFiles,
      'data/old.csv': '1',
      'runs/old/daily.csv': '2',
      'runs/README.md': 'about runs',
      '.gitattributes': '* text',
      'stoplog.seals.json': '{}',
    };
    expect((await recordsOf(smallStudy, more)).unaccounted).toEqual(['data/old.csv', 'runs/old/daily.csv']);
  });

  it('do not include what a manifest below governs', async () => {
    const more = { ...smallFiles, 'models/upper/stoplog.yaml': 'stoplog: 1', 'models/upper/data.csv': '1' };
    expect((await recordsOf(smallStudy, more)).unaccounted).toEqual([]);
  });
});
