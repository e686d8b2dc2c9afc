import { describe, expect, it } from 'vitest';
import type { Problem } from './manifest.ts';
import { readManifest } from './read.ts';

const problemsOf = (text: string): readonly Problem[] => readManifest('stoplog.yaml', text).problems;

/** What is at fault, the text, where (line, column, field), what is said, and the known key that is offered. */
type Case = readonly [what: string, text: string, where: string, message: string, nearest?: string];

/** One mistake each. Every text but those that are no manifest at all begins with `stoplog: 1`. */
const syntax: readonly Case[] = [
  ['an empty file', '', '1:1 ', 'The manifest is empty; begin with the line `stoplog: 1` and a `study`.'],
  [
    'only comments',
    '# to do\n',
    '1:1 ',
    'The manifest is empty; begin with the line `stoplog: 1` and a `study`.',
  ],
  [
    'a list',
    '- a\n',
    '1:1 ',
    'The manifest is no map of keys; begin with the line `stoplog: 1` and a `study`.',
  ],
  [
    'not UTF-8',
    'stoplog: 1\nstudy: {title: \uFFFD}',
    '2:16 ',
    'The file is not UTF-8 text, so nothing in it can be read; save it as UTF-8.',
  ],
  [
    'UTF-16',
    's\0t\0o\0',
    '1:2 ',
    'The file is not UTF-8 text, so nothing in it can be read; save it as UTF-8.',
  ],
  [
    'another indentation',
    'stoplog: 1\nstudy:\n  id: a\n title: b\n',
    '4:1 ',
    'This line is not indented like the keys that it belongs to, or a bracket above it is not closed: `title: b`.',
  ],
  [
    'a tab',
    'stoplog: 1\nstudy:\n\tid: a\n',
    '3:1 ',
    'This line is indented with a tab; YAML takes only blanks: `id: a`.',
  ],
  [
    'a colon in a text',
    'stoplog: 1\nstudy:\n  title: Brook: a model\n',
    '3:10 ',
    'A second `: ` stands in this value, or the line below is indented too far; put a text that holds `: ` in quotes: `Brook: a model`.',
  ],
  [
    'a key without a colon',
    'stoplog: 1\nstudy:\n  id a\n  title: b\n',
    '3:3 ',
    'This is neither `key: value` nor a list entry; perhaps the colon, or the blank after it, is missing: `id a`.',
  ],
  [
    'a sign that needs quotes',
    'stoplog: 1\nstudy: {title: @home}\n',
    '2:16 ',
    'A value can’t begin with this character unless it stands in quotes: `@home}`.',
  ],
  [
    'a quote that is not closed',
    'stoplog: 1\nstudy: {title: "a}\n',
    '2:16 ',
    'This quote is not closed: `"a}`.',
  ],
  [
    'a bracket that is not closed',
    'stoplog: 1\nstudy: {id: a\nmodel: {}\n',
    '3:1 ',
    'This line is not indented like the keys that it belongs to, or a bracket above it is not closed: `model: {}`.',
  ],
  [
    'a pattern without quotes',
    'stoplog: 1\ncovers: [**/x]\n',
    '2:10 covers[0]',
    'A value that begins with `*` must stand in quotes: write "**/x".',
  ],
  [
    'a second document',
    'stoplog: 1\n---\nstoplog: 1\n',
    '2:1 ',
    'A second YAML document begins after `---`; a manifest is one document, and each model has a file of its own.',
  ],
  [
    'a tag',
    'stoplog: 1\nstudy: {id: !!str 5}\n',
    '2:19 study.id',
    'A tag (`!`) stands before this value; write the value plainly, and in quotes if it is a text.',
  ],
  [
    'a key that stands twice',
    'stoplog: 1\nstudy: {}\nmodel: {}\nstudy: {}\n',
    '4:1 study',
    '`study` stands twice in one map, first in line 2; merge the two, or rename one.',
  ],
  [
    'a key that is a list',
    'stoplog: 1\nstudy: {[a]: 1}\n',
    '2:9 study',
    'A key is empty, or is itself a list or a map; a key is a plain text.',
  ],
  [
    'an alias inside what it repeats',
    'stoplog: 1\nstudy: &s {id: *s}\n',
    '2:16 study.id',
    '`*s` repeats the very part that it stands in; write that value out.',
  ],
  [
    'a conflict that was left',
    'stoplog: 1\nstudy:\n<<<<<<< HEAD\n  id: a\n',
    '3:1 ',
    'A merge conflict was left here; keep what is true of both sides and take the marker out.',
  ],
];

const schema: readonly Case[] = [
  [
    'no number of the format',
    'study: {}\n',
    '1:1 ',
    'The manifest lacks `stoplog`; expected 1, the number of this format.',
  ],
  [
    'another format',
    'stoplog: 2\n',
    '1:10 stoplog',
    '`stoplog` is 2; expected 1, the number of this format.',
  ],
  [
    'an unknown section',
    'stoplog: 1\nstdy: {}\n',
    '2:1 stdy',
    '`stdy` is no key of a manifest; perhaps `study` is meant.',
    'study',
  ],
  [
    'an unknown key',
    'stoplog: 1\nstudy:\n  titel: a\n',
    '3:3 study.titel',
    '`titel` is no key of `study`; perhaps `title` is meant.',
    'title',
  ],
  [
    'an unknown key like no other',
    'stoplog: 1\nmodel: {source: {branch: main}}\n',
    '2:18 model.source.branch',
    '`branch` is no key of `model.source`; it knows url, commit, doi.',
  ],
  [
    'an unknown key of a layout',
    'stoplog: 1\ninputs: {a: {series: {seperator: tab}}}\n',
    '2:23 inputs.a.series.seperator',
    '`seperator` is no key of `inputs.a.series`; perhaps `separator` is meant.',
    'separator',
  ],
  [
    'a mistyped key that is needed',
    'stoplog: 1\ninputs: {a: {series: {time: {column: d, patern: YYYY}}}}\n',
    '2:41 inputs.a.series.time.patern',
    '`patern` is no key of `inputs.a.series.time`; perhaps `pattern` is meant.',
    'pattern',
  ],
  [
    'a key that is needed',
    'stoplog: 1\nreadings:\n  - {of: model.release, take: {key: a}}\n',
    '3:5 readings[0]',
    '`readings[0]` lacks `file`.',
  ],
  [
    'one of two keys',
    'stoplog: 1\ndepartures: [{now: 1, because: a}]\n',
    '2:14 departures[0]',
    '`departures[0]` lacks a `rule` or a `threshold`.',
  ],
  [
    'a version without quotes',
    'stoplog: 1\nmodel: {version: 1.10}\n',
    '2:18 model.version',
    '`model.version` is 1.10 without quotes, which YAML does not read as a text; write it in quotes: "1.10".',
  ],
  [
    'a commit that looks like a number',
    'stoplog: 1\nmodel: {source: {commit: 12e4567}}\n',
    '2:26 model.source.commit',
    '`model.source.commit` is 12e4567 without quotes, which YAML does not read as a text; write it in quotes: "12e4567".',
  ],
  [
    'true for a text',
    'stoplog: 1\nmodel: {release: true}\n',
    '2:18 model.release',
    '`model.release` is true without quotes, which YAML does not read as a text; write it in quotes: "true".',
  ],
  [
    'a text for a figure',
    'stoplog: 1\nevaluation: {a: {scores: {validation: {nse: "0.7"}}}}\n',
    '2:45 evaluation.a.scores.validation.nse',
    '`evaluation.a.scores.validation.nse` is "0.7"; expected a number.',
  ],
  [
    'a figure that is not finite',
    'stoplog: 1\ncatchment: {area: {value: .inf, unit: km2}}\n',
    '2:27 catchment.area.value',
    '`catchment.area.value` is .inf; expected a number above 0.',
  ],
  [
    'a text for true or false',
    'stoplog: 1\nsetup: {choices: [{default: yes}]}\n',
    '2:29 setup.choices[0].default',
    '`setup.choices[0].default` is "yes"; expected true or false.',
  ],
  [
    'a list for a map',
    'stoplog: 1\nstudy: []\n',
    '2:8 study',
    '`study` is an empty list; expected a map of keys.',
  ],
  [
    'a text for a list',
    'stoplog: 1\nruns: {a: {start: node run.mjs}}\n',
    '2:19 runs.a.start',
    '`runs.a.start` is "node run.mjs"; expected a list of words such as [node, model/run.mjs, --out, runs/calibrated].',
  ],
  [
    'nothing after a key',
    'stoplog: 1\nstudy:\n  purpose:\n',
    '3:3 study.purpose',
    '`study.purpose` is empty; expected a text. Fill it in, or take the key out.',
  ],
  [
    'an empty list entry',
    'stoplog: 1\ncovers:\n  - a\n  -\n',
    '4:4 covers[1]',
    '`covers[1]` is empty; expected a text. Fill it in, or take the key out.',
  ],
  [
    'a mistyped phase',
    'stoplog: 1\nstudy: {phase: calibraton}\n',
    '2:16 study.phase',
    '`study.phase` is "calibraton"; expected one of setup, calibration, validation, application, archive. Perhaps `calibration` is meant.',
  ],
  [
    'an unknown role',
    'stoplog: 1\nbalance: {a: {potential_for: trees}}\n',
    '2:30 balance.a.potential_for',
    '`balance.a.potential_for` is "trees"; expected one of grass, modelled_cover, open_water.',
  ],
  [
    'a day that is none',
    'stoplog: 1\nmodel: {released: 2025-02-29}\n',
    '2:19 model.released',
    '`model.released` is "2025-02-29"; expected a calendar date such as 2026-01-14.',
  ],
  [
    'a period that runs backwards',
    'stoplog: 1\nperiods: {simulation: 2009-10-01/2003-09-30}\n',
    '2:23 periods.simulation',
    '`periods.simulation` is "2009-10-01/2003-09-30"; expected a period first-day/last-day such as 2003-10-01/2009-09-30, both real calendar dates, the first not after the last.',
  ],
  [
    'a period where a list belongs',
    'stoplog: 1\nperiods: {calibration: 2003-10-01/2009-09-30}\n',
    '2:24 periods.calibration',
    '`periods.calibration` is "2003-10-01/2009-09-30"; expected a list of periods such as [2003-10-01/2009-09-30].',
  ],
  [
    'a warm-up in years',
    'stoplog: 1\nperiods: {warm_up: 3}\n',
    '2:20 periods.warm_up',
    '`periods.warm_up` is 3; expected a period first-day/last-day such as 2001-10-01/2003-09-30, or {zero_because: reason}.',
  ],
  [
    'an hour without quotes or zero',
    'stoplog: 1\ninputs: {a: {series: {day_ends: 9:00}}}\n',
    '2:33 inputs.a.series.day_ends',
    '`inputs.a.series.day_ends` is "9:00"; expected an hour such as "09:00" or "24:00".',
  ],
  [
    'a share in percent',
    'stoplog: 1\ninputs: {a: {missing_share: 1.3}}\n',
    '2:29 inputs.a.missing_share',
    '`inputs.a.missing_share` is 1.3; expected a share from 0 to 1, {per_file: {...}} or {table: path}.',
  ],
  [
    'a level in percent',
    'stoplog: 1\nuncertainty: {bands: {q: {level: 95}}}\n',
    '2:34 uncertainty.bands.q.level',
    '`uncertainty.bands.q.level` is 95; expected a number above 0 and below 1.',
  ],
  [
    'a range with one end',
    'stoplog: 1\nparameters: {values: [{name: a, range: [50]}]}\n',
    '2:40 parameters.values[0].range',
    '`parameters.values[0].range` is a list; expected two numbers: least and greatest, such as [50, 400].',
  ],
  [
    'a list that may not be empty',
    'stoplog: 1\ninterventions: []\n',
    '2:16 interventions',
    '`interventions` is an empty list; expected a list of at least 1 entry.',
  ],
  [
    'a file elsewhere without its path',
    'stoplog: 1\ninputs: {a: {files: [{bytes: 3}]}}\n',
    '2:22 inputs.a.files[0]',
    '`inputs.a.files[0]` lacks `path`.',
  ],
  [
    'a name with a dot',
    'stoplog: 1\ninputs: {gauge.1: {}}\n',
    '2:10 inputs.gauge.1',
    'The name "gauge.1" can’t be used; expected a name of letters, digits, `_` and `-` that begins with a letter or digit.',
  ],
  [
    'a name that reaches for the prototype',
    'stoplog: 1\ninputs: {__proto__: {}}\n',
    '2:10 inputs.__proto__',
    'The name "__proto__" can’t be used; expected a name of letters, digits, `_` and `-` that begins with a letter or digit.',
  ],
  [
    'a unit that is a list',
    'stoplog: 1\ninputs: {a: {series: {comment: "//"}}}\n',
    '2:32 inputs.a.series.comment',
    '`inputs.a.series.comment` is "//"; expected a single character such as "#".',
  ],
];

describe.for([...syntax, ...schema])('%s', ([, text, where, message, nearest]) => {
  it('is one problem, at its place, with what was expected', () => {
    const [problem, ...more] = problemsOf(text);
    expect(more).toEqual([]);
    expect(problem).toMatchObject({ message });
    expect(`${problem?.line}:${problem?.column} ${problem?.field}`).toBe(where);
    expect(problem?.nearest).toBe(nearest);
    expect(problem?.expected).not.toBe('');
    expect(problem?.found).not.toBe('');
  });
});

describe('many faults', () => {
  it('are all told at once, in order of place, also past a fault of YAML', () => {
    const text = [
      'stoplog: 1',
      'study:',
      '  title: Brook: a model',
      'model:',
      '  version: 1.4',
      '  relase: "1.4.2"',
      'inputs:',
      '  rain:',
      '    role: rain',
      '    files: [*.csv]',
      'inputs: {}',
    ].join('\n');
    expect(problemsOf(text).map(({ line, column }) => [line, column])).toEqual([
      [3, 10],
      [5, 12],
      [6, 3],
      [9, 11],
      [10, 13],
      [11, 1],
    ]);
  });

  it('are told for the list or map that was meant, where several may stand', () => {
    const text =
      'stoplog: 1\ninputs: {a: {files: [{path: b, sha256: 12, size: 3}], series: {time: {year: 1, moth: 2}}}}';
    expect(problemsOf(text).map(({ field, nearest }) => [field, nearest])).toEqual([
      ['inputs.a.files[0].sha256', undefined],
      ['inputs.a.files[0].size', undefined],
      ['inputs.a.series.time.moth', 'month'],
    ]);
  });

  it('are as many as there are mistakes', () => {
    const records = Array.from({ length: 500 }, (_, place) => `  g${place}: {rol: precipitation}`);
    expect(problemsOf(`stoplog: 1\ninputs:\n${records.join('\n')}\n`)).toHaveLength(500);
  });
});

describe('a manifest that means harm', () => {
  const first = (text: string): string | undefined => problemsOf(text)[0]?.message;

  it.each([
    ['brackets', '['.repeat(200_000)],
    ['flow maps', '{a: '.repeat(200_000)],
    ['list entries on one line', '- '.repeat(100_000)],
    ['indented keys', Array.from({ length: 2000 }, (_, depth) => `${' '.repeat(depth)}a:`).join('\n')],
  ])('can’t nest %s without end', (_, text) => {
    expect(first(`stoplog: 1\nstudy:\n ${text.replaceAll('\n', '\n ')}`)).toMatch(
      /^Lists and maps stand too deeply/,
    );
  });

  it('can’t grow without end through aliases', () => {
    const tens = [...'bcdefghij'].map(
      (name, place) => `${name}: &${name} [${Array(10).fill(`*${'abcdefghi'[place]}`).join(', ')}]`,
    );
    expect(first(`a: &a [x, x, x, x, x, x, x, x, x, x]\n${tens.join('\n')}`)).toMatch(
      /^Aliases .* repeat too much/,
    );
  });

  it('can’t be longer than can be read at each commit', () => {
    expect(first(`stoplog: 1\n# ${'x'.repeat(2 * 1024 * 1024)}\n`)).toMatch(/^The manifest is too long/);
  });

  it('can’t change what every object inherits', () => {
    problemsOf(
      'stoplog: 1\n__proto__: {polluted: 1}\ninputs: {__proto__: {polluted: 1}}\nstudy: {constructor: {prototype: {polluted: 1}}}\n',
    );
    expect('polluted' in {}).toBe(false);
  });

  it('can’t reach what objects inherit by a name', () => {
    const { manifest } = readManifest('stoplog.yaml', 'stoplog: 1\ninputs: {rain: {}}\n');
    expect(manifest?.data.inputs?.constructor).toBeUndefined();
  });

  it.each([
    '\u0001',
    'stoplog: 1\u2028',
    '&',
    '*',
    '!',
    '%',
    '? ',
    ': ',
    '---',
    '...',
    '|',
    '>',
    '"',
    "'",
    '{',
    ']',
    '@',
    '\t',
    '#',
    '--- !!binary |\n',
    '<<: *a',
    'a: &b',
    '\uD800',
  ])('is told to be no manifest: %j', (text) => {
    expect(problemsOf(text).length).toBeGreaterThan(0);
  });
});
