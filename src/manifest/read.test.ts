import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { Manifest, Problem } from './manifest.ts';
import { readManifest } from './read.ts';

const sound = readFileSync('tests/harness/sound.yaml', 'utf8');

function manifestOf(text: string, path = 'stoplog.yaml'): Manifest {
  const { manifest, problems } = readManifest(path, text);
  if (manifest === null) throw new Error(JSON.stringify(problems, null, 1));
  return manifest;
}

const problemsOf = (text: string): readonly Problem[] => readManifest('stoplog.yaml', text).problems;

describe('a sound manifest', () => {
  const manifest = manifestOf(sound, 'models/harrow/stoplog.yaml');

  it('is read with its path, the folder that it governs and its text', () => {
    expect(manifest).toMatchObject({
      path: 'models/harrow/stoplog.yaml',
      folder: 'models/harrow',
      text: sound,
    });
  });

  it('keeps dates and quoted versions as texts, and figures as numbers', () => {
    const { study, model, inputs, parameters, runs } = manifest.data;
    expect(study?.phase).toBe('application');
    expect([model?.version, model?.released, model?.source?.commit]).toEqual([
      '2.1',
      '2020-05-04',
      '3fa94c1',
    ]);
    expect(inputs?.rainfall?.period).toBe('2001-10-01/2010-09-30');
    expect(inputs?.rainfall?.series?.missing).toEqual(['']);
    expect(parameters?.values?.[2]?.range).toEqual([-1, 2]);
    expect(runs?.calibrated?.agreement?.relative).toBe(1e-9);
  });

  it('is the same with Windows line ends and with a byte-order mark', () => {
    expect(manifestOf(sound.replaceAll('\n', '\r\n')).data).toEqual(manifest.data);
    expect(manifestOf(`\uFEFF${sound}`).data).toEqual(manifest.data);
  });
});

describe('a field of a manifest', () => {
  const manifest = manifestOf(
    [
      '# invented',
      'stoplog: 1',
      '',
      'model:',
      '  version: "1.4"',
      '  executable: [model/a.mjs, model/b.mjs]',
      'catchment:',
      '  area: {value: 50, unit: km2}',
      'evaluation:',
      '  flow: {scores: {calibration: {nse: 0.80, pbias: -2.0}}}',
    ].join('\n'),
  );

  it.each([
    [[], 2, 1],
    [['model'], 4, 1],
    [['model', 'version'], 5, 3],
    [['model', 'executable', 1], 6, 29],
    [['catchment', 'area', 'unit'], 8, 21],
    [['catchment', 'area', 'no-such', 'key'], 8, 3],
    [['model', 'executable', 2], 6, 3],
    [['no-such'], 2, 1],
  ] as const)('%j has its place, or that of its nearest ancestor', (field, line, column) => {
    expect(manifest.position(field)).toEqual({ line, column });
  });

  it('keeps how its figure is written', () => {
    const score = (name: string) => manifest.source(['evaluation', 'flow', 'scores', 'calibration', name]);
    expect([score('nse'), score('pbias'), score('rmse')]).toEqual(['0.80', '-2.0', null]);
    expect(manifest.source(['model', 'version'])).toBe('1.4');
    expect(manifest.source(['model'])).toBeNull();
  });
});

describe('what a manifest may state', () => {
  it.each([
    ['no earlier work', 'study: {literature: {none_found: {sought_in: [county library], on: 2026-01-12}}}'],
    [
      'a container in place of files',
      `model: {container: {image: two-store, digest: "sha256:${'ab'.repeat(32)}"}}`,
    ],
    [
      'files kept elsewhere',
      `inputs: {radar: {stored: elsewhere, files: [{path: a.nc, sha256: ${'ab'.repeat(32)}, bytes: 12, location: shelf 3}]}}`,
    ],
    ['published digests', `inputs: {a: {source: {published_sha256: {data/a.csv: ${'ab'.repeat(32)}}}}}`],
    ['one record for each gauge', 'inputs: {gauge: {each: [g001, g002], files: ["data/{each}.csv"]}}'],
    ['one record for each row of a table', 'inputs: {gauge: {each: {table: data/gauges.csv}}}'],
    ['weights', 'inputs: {rain: {combine: {weights: {data/a.csv: 0.4, data/b.csv: 0.6}}}}'],
    ['missing shares by file', 'inputs: {rain: {missing_share: {per_file: {data/a.csv: 0.01}}}}'],
    ['negative values', 'inputs: {tide: {may_be_negative_because: tidal reach}}'],
    ['time in a pattern', 'inputs: {a: {series: {time: {column: Datum, pattern: "DD.MM.YYYY hh:mm"}}}}'],
    [
      'time in columns',
      'inputs: {a: {series: {time: {year: 1, month: 2, day: 3}, values: 4, header: false}}}',
    ],
    ['time as day of the year', 'inputs: {a: {series: {time: {year: y, day_of_year: d}}}}'],
    ['time as a count', 'inputs: {a: {series: {time: {counter: step, first: 0, starts: 2001-10-01}}}}'],
    [
      'several columns, decimal commas',
      'inputs: {a: {series: {values: [a, b], separator: semicolon, decimal: comma}}}',
    ],
    [
      'paths of every kind',
      'inputs: {a: {missing_share: {per_file: {./a.csv: 0, _b.csv: 0, .c.csv: 0, "d e.csv": 0}}}}',
    ],
    ['samples', 'inputs: {a: {series: {step: irregular}}}'],
    ['no warm-up', 'periods: {warm_up: {zero_because: starts from observed stores}}'],
    [
      'readings of each form',
      'readings: [{of: a, file: b, take: {key: k}}, {of: a, file: b, take: {row: 2, column: v}}, {of: a, file: b, take: {line: 4}}, {of: a, file: b, take: {pattern: "x(.)"}}, {of: a, file: b, take: {pointer: /time/start}}]',
    ],
    [
      'parameters in a table',
      'parameters: {table: {file: p.csv, separator: tab}, sensitivity: {none_because: two parameters}}',
    ],
    [
      'handbook classes',
      'parameters: {values: [{name: cn, calibrated: false, handbook: {table: curve-number, class: pasture, soil_group: B, impervious_share: 0.1}}]}',
    ],
    ['scores in a table', 'evaluation: {a: {scores: {table: runs/scores.csv}}}'],
    [
      'a variable that is not evaluated',
      'evaluation: {sediment: {variable: sediment, none_because: no samples}}',
    ],
    [
      'windows of one target',
      'evaluation: {a: {periods: {calibration: [2003-10-01/2004-09-30]}, split_test: differential}}',
    ],
    [
      'no interventions',
      'interventions: {none_because: moorland, accepts: [{rule: x.y, because: a, by: b, on: 2026-01-01}]}',
    ],
    ['no scenarios', 'scenarios: {none_because: the study ends with the present climate}'],
    [
      'departures of both kinds',
      'departures: [{rule: a.b, now: warns, because: c}, {threshold: a.b, now: 0.5, because: c}]',
    ],
    ['names that look like numbers or like built-in ones', 'runs: {2001: {}, constructor: {}, toString: {}}'],
    ['shared blocks by alias', 'inputs: {a: {source: &s {provider: Office}}, b: {source: *s}}'],
  ])('%s', (_, text) => {
    expect(problemsOf(`stoplog: 1\n${text}\n`)).toEqual([]);
  });

  it.each(['study', 'catchment', 'model', 'periods', 'setup', 'parameters', 'uncertainty'])(
    'acceptances and further dependences in %s',
    (section) => {
      const text = `stoplog: 1\n${section}: {rests_on: [model], note: a, accepts: [{rule: a.b, because: c, by: d, on: 2026-01-01}]}`;
      expect(problemsOf(text)).toEqual([]);
    },
  );

  it.each(['inputs', 'runs', 'evaluation', 'balance', 'scenarios'])(
    'acceptances and further dependences in a record of %s',
    (area) => {
      const record =
        '{rests_on: [model], note: a, accepts: [{rule: a.b, because: c, by: d, on: 2026-01-01}]}';
      const named = area === 'scenarios' ? `{cases: {a: ${record}}}` : `{a: ${record}}`;
      expect(problemsOf(`stoplog: 1\n${area}: ${named}`)).toEqual([]);
    },
  );
});
