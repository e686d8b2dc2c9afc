import { describe, expect, it } from 'vitest';
import { recordsOf } from '../../tests/records/in-memory.ts';
import { smallFiles, smallStudy } from '../../tests/records/small-study.ts';
import type { FilesInMemory } from '../repository/memory.ts';
import type { Records } from './record.ts';

const study = (text = smallStudy, files: FilesInMemory = smallFiles): Promise<Records> =>
  recordsOf(text, files);

describe('what rests on what', () => {
  // The table of records in the design of seals, row by row.
  it.each<[string, string[]]>([
    ['study', []],
    ['catchment', []],
    ['periods', []],
    ['setup', []],
    ['model', []],
    ['inputs.rainfall', []],
    ['inputs.radar', []],
    ['parameters', ['inputs.flow', 'inputs.rainfall', 'model', 'periods.calibration', 'setup']],
    [
      'runs.calibrated',
      [
        'inputs.rainfall',
        'interventions.settings',
        'model',
        'parameters',
        'periods.simulation',
        'periods.warm_up',
        'setup',
      ],
    ],
    ['evaluation.outlet', ['inputs.flow', 'periods.calibration', 'periods.validation', 'runs.calibrated']],
    ['balance.catchment', ['runs.calibrated']],
    ['interventions', ['inputs.check', 'runs.calibrated']],
    ['uncertainty', ['evaluation.outlet', 'periods.validation', 'runs.calibrated']],
    [
      'scenarios.dry',
      [
        'evaluation.outlet',
        'inputs.future',
        'inputs.rainfall',
        'periods.calibration',
        'periods.year_begins',
        'runs.calibrated',
        'runs.dry',
      ],
    ],
  ])('%s', async (id, restsOn) => {
    expect((await study()).nodes.get(id)?.restsOn).toEqual(restsOn);
  });

  it('puts first what others rest on, and knows every digest', async () => {
    const { nodes, digests, circle } = await study();
    const order = [...nodes.keys()];
    for (const { id, restsOn, digest } of nodes.values()) {
      for (const below of restsOn) {
        if (nodes.has(below)) expect(order.indexOf(below)).toBeLessThan(order.indexOf(id));
        expect(digests.get(below)).toMatch(/^[0-9a-f]{64}$/);
      }
      expect(digests.get(id)).toBe(digest);
    }
    expect(circle).toBeNull();
  });

  it('adds what `rests_on` names, also a field', async () => {
    const text = smallStudy.replace(
      'catchment: {name',
      'catchment: {rests_on: [inputs.check, periods.simulation], name',
    );
    const { nodes, unknown } = await study(text);
    expect(nodes.get('catchment')?.restsOn).toEqual(['inputs.check', 'periods.simulation']);
    expect(unknown).toEqual([]);
  });

  it('takes windows that a target or a run states itself for theirs', async () => {
    const text = smallStudy
      .replace(
        '    observed: {input: flow}',
        '    observed: {input: flow}\n    periods: {calibration: [2004-10-01/2006-09-30]}',
      )
      .replace('  dry: {takes', '  dry: {simulation: 2041-10-01/2049-09-30, takes');
    const { nodes } = await study(text);
    expect(nodes.get('evaluation.outlet')?.restsOn).not.toContain('periods.calibration');
    expect(nodes.get('parameters')?.restsOn).toContain('evaluation.outlet.periods.calibration');
    expect(nodes.get('runs.dry')?.restsOn).not.toContain('periods.simulation');
    expect(nodes.get('runs.dry')?.restsOn).toContain('periods.warm_up');
  });

  it('takes the data of the evaluated runs for those of a calibration that does not say', async () => {
    const { nodes } = await study(smallStudy.replace(', on: [rainfall, flow]', ''));
    expect(nodes.get('parameters')?.restsOn).toEqual(
      expect.arrayContaining(['inputs.rainfall', 'inputs.flow']),
    );
  });
});

describe('digests', () => {
  const digestsWith = async (text: string, files: FilesInMemory = smallFiles) => {
    const [before, after] = await Promise.all([study(), study(text, files)]);
    return [...before.nodes.keys()].filter(
      (id) => before.nodes.get(id)?.digest !== after.nodes.get(id)?.digest,
    );
  };
  const withFile = (path: string) => digestsWith(smallStudy, { ...smallFiles, [path]: 'changed' });

  it('of a changed validation window leave the parameters and the runs alone', async () => {
    const changed = await digestsWith(smallStudy.replace('2006-10-01/2009-09-30', '2007-10-01/2009-09-30'));
    expect(changed.sort()).toEqual(['evaluation.outlet', 'periods', 'scenarios.dry', 'uncertainty']);
  });

  it('of a changed calibration window change the parameters and all above', async () => {
    const changed = await digestsWith(smallStudy.replace('2003-10-01/2006-09-30', '2004-10-01/2006-09-30'));
    expect(changed).toEqual(
      expect.arrayContaining([
        'parameters',
        'runs.calibrated',
        'runs.dry',
        'evaluation.outlet',
        'balance.catchment',
      ]),
    );
  });

  it('of changed settings reach the runs where the model represents the intervention, and only there', async () => {
    expect(await withFile('model/reservoir.txt')).toEqual(
      expect.arrayContaining(['interventions', 'runs.calibrated']),
    );
    expect(await withFile('model/unused.txt')).toEqual(['interventions']);
  });

  it('do not depend on prose, acceptances, comparisons, or readings', async () => {
    expect(await digestsWith(smallStudy.replace('It fits the question.', 'It suits.'))).toEqual([]);
    expect(await digestsWith(smallStudy.replace('short record', 'few years'))).toEqual([]);
    expect(await withFile('data/check.csv')).toEqual(['inputs.check', 'interventions']);
    expect(await digestsWith(smallStudy.replace(/readings:\n.*\n/, ''))).toEqual([]);
  });

  it('do not depend on the folder that the study lies in, nor on the order of keys', async () => {
    const below = Object.fromEntries(
      Object.entries(smallFiles).map(([path, text]) => [`models/upper/${path}`, text]),
    );
    const moved = await recordsOf(smallStudy, below, { path: 'models/upper/stoplog.yaml' });
    const before = await study();
    expect([...moved.digests]).toEqual([...before.digests]);
    const turned = smallStudy.replace(
      '{id: low-flow, purpose: Low flow at the mill',
      '{purpose: Low flow at the mill, id: low-flow',
    );
    expect((await study(turned)).nodes.get('study')?.digest).toBe(before.nodes.get('study')?.digest);
  });

  it('of a scenario change with the conditions', async () => {
    expect(
      await digestsWith(
        smallStudy.replace('rain: {input: rainfall, by: year}', 'rain: {input: rainfall, by: month}'),
      ),
    ).toEqual(['scenarios.dry']);
  });
});

describe('circles', () => {
  const text = `stoplog: 1
study: {id: s}
model: {name: m, rests_on: [runs.a]}
runs:
  a: {takes: [runs.b]}
  b: {takes: [runs.a]}
  c: {takes: [runs.a]}
  d: {simulation: 2001-01-01/2001-12-31}
`;

  it('are found and written as a circle; what lies in or above one has no digest', async () => {
    const { circle, nodes } = await recordsOf(text, {});
    expect(circle?.at(0)).toBe(circle?.at(-1));
    expect(new Set(circle)).toEqual(new Set(['model', 'runs.a']));
    const without = [...nodes.values()].filter(({ digest }) => digest === '').map(({ id }) => id);
    expect(without.sort()).toEqual(['model', 'runs.a', 'runs.b', 'runs.c', 'runs.d']);
    expect(nodes.get('study')?.digest).toMatch(/^[0-9a-f]{64}$/);
  });

  it('are none where a field of a record is rested on that rests on the other', async () => {
    // Runs rest on the settings of interventions; the record of interventions rests on a run (its seasons).
    expect((await study()).circle).toBeNull();
  });
});

describe('names', () => {
  it.each([
    [
      'takes: [inputs.rainfall, parameters',
      'takes: [inputs.rainfal, parameters',
      'runs.calibrated',
      'inputs.rainfal',
      'inputs.rainfall',
    ],
    [
      'observed: {input: flow}\n    sim',
      'observed: {input: flwo}\n    sim',
      'evaluation.outlet',
      'flwo',
      'flow',
    ],
    ['on: [rainfall, flow]', 'on: [rainfall, stage]', 'parameters', 'stage', undefined],
    ['compare_with: {input: check}', 'compare_with: {input: chek}', 'inputs.rainfall', 'chek', 'check'],
    ['bands: {outlet:', 'bands: {outlets:', 'uncertainty', 'outlets', 'outlet'],
    ['- {of: periods.warm_up', '- {of: period.warm_up', 'manifest', 'period.warm_up', undefined],
  ])('%s -> %s', async (known, mistyped, record, name, nearest) => {
    const { unknown } = await study(smallStudy.replace(known, mistyped));
    expect(unknown.map(({ field: _, ...one }) => one)).toContainEqual({ record, name, nearest });
  });
});

describe('each', () => {
  const text = `stoplog: 1
study: {id: s}
inputs:
  gauge: {each: {table: {file: data/gauges.csv, skip_lines: 1, separator: semicolon}}, role: streamflow, files: ["data/{each}.csv"]}
  other: {each: [a, b], role: streamflow, files: ["data/{each}.csv"]}
runs:
  all: {takes: [inputs.gauge]}
covers: ["data/**"]
`;
  const files = {
    'data/gauges.csv': '# invented\nname;area\n"g1";3\r\n g2 ;4\n\n',
    'data/g1.csv': '1',
    'data/g2.csv': '2',
    'data/a.csv': '3',
  };

  it('makes one record for each entry of a list or a table, and a name for all of them', async () => {
    const { nodes, unmatched, unaccounted } = await recordsOf(text, files);
    expect([...(nodes.get('inputs.gauge.g2')?.claims.keys() ?? [])]).toEqual(['data/g2.csv']);
    expect(nodes.get('runs.all')?.restsOn).toEqual(['inputs.gauge.g1', 'inputs.gauge.g2']);
    expect(nodes.get('inputs.other.a')?.field).toEqual(['inputs', 'other']);
    expect(unmatched.map(({ record, pattern }) => [record, pattern])).toEqual([
      ['inputs.other.b', 'data/b.csv'],
    ]);
    expect(unaccounted).toEqual([]);
  });

  it('says where the table is missing', async () => {
    const { unmatched, unknown } = await recordsOf(text, { 'data/a.csv': '', 'data/b.csv': '' });
    expect(unmatched).toMatchObject([
      {
        record: 'inputs.gauge',
        pattern: 'data/gauges.csv',
        field: ['inputs', 'gauge', 'each', 'table', 'file'],
      },
    ]);
    expect(unknown).toEqual([]);
  });

  it('leaves the other records alone when an entry is added', async () => {
    const before = await recordsOf(text, files);
    const after = await recordsOf(text, {
      ...files,
      'data/gauges.csv': `${files['data/gauges.csv']}g3;5\n`,
      'data/g3.csv': '',
    });
    expect(after.nodes.get('inputs.gauge.g1')?.digest).toBe(before.nodes.get('inputs.gauge.g1')?.digest);
    expect(after.nodes.has('inputs.gauge.g3')).toBe(true);
  });
});
