import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it, test } from 'vitest';
import { isScalar, parseDocument } from 'yaml';
import { Failure } from '../failure.ts';
import { replaceScalars, type ScalarEdit } from './edit.ts';
import type { FieldPath, Manifest } from './manifest.ts';
import { readManifest } from './read.ts';

function manifestOf(text: string): Manifest {
  const { manifest, problems } = readManifest('stoplog.yaml', text);
  if (manifest === null) throw new Error(JSON.stringify(problems, null, 1));
  return manifest;
}

const edited = (text: string, ...edits: readonly ScalarEdit[]): string =>
  replaceScalars(manifestOf(text), edits);

const nse: FieldPath = ['evaluation', 'q', 'scores', 'validation', 'nse'];
const kge: FieldPath = ['evaluation', 'q', 'scores', 'validation', 'kge'];
const scores = (validation: string) =>
  `stoplog: 1\nevaluation:\n  q:\n    scores:\n      validation:${validation.startsWith('\n') ? '' : ' '}${validation}\n    step: P1D\n`;

describe('a figure that stands there', () => {
  it.each([
    [
      'keeps comment and blanks',
      '{ nse:   0.71,  kge: 0.8 } # looked at',
      0.69,
      '{ nse:   0.69,  kge: 0.8 } # looked at',
    ],
    ['keeps its decimals', '{nse: 0.71}', 0.7, '{nse: 0.70}'],
    ['takes more decimals if it needs them', '{nse: 0.71}', 0.708, '{nse: 0.708}'],
    ['may be negative', '{nse: 0.71}', -1.25, '{nse: -1.25}'],
    ['may be very small', '{nse: 0.71}', 1e-9, '{nse: 1e-9}'],
    ['stays as written where nothing changes', '{nse: 7.10e-1}', 0.71, '{nse: 7.10e-1}'],
    [
      'stands on lines of its own',
      '\n        # of 2021\n        nse: 0.71 # a\n        kge: 0.8',
      0.69,
      '\n        # of 2021\n        nse: 0.69 # a\n        kge: 0.8',
    ],
  ])('%s', (_, before, value, after) => {
    expect(edited(scores(before), { field: nse, value })).toBe(scores(after));
  });

  it('is written for several at once, in any order', () => {
    const both = [
      { field: kge, value: 2 },
      { field: nse, value: 1 },
    ] as const;
    expect(edited(scores('{nse: 0.71, kge: 0.8}'), ...both)).toBe(scores('{nse: 1.00, kge: 2.0}'));
  });

  it.each([
    ['that is plain stays so', 'a b', 'c d', 'c d'],
    ['gets quotes where it needs them', 'a b', 'c: d', '"c: d"'],
    ['gets quotes where it looks like a number', 'a b', '1.4', '"1.4"'],
    ['in single quotes stays so', "'a'", "it's", "'it''s'"],
    ['in double quotes stays so', '"a"', 'say "b"', '"say \\"b\\""'],
    ['gets double quotes for a line end', "'a'", 'b\nc', '"b\\nc"'],
    ['on lines of its own gets quotes', '|\n    a\n    b', 'c', '"c"'],
    ['that is folded gets quotes', '>-\n    a', 'c', '"c"'],
  ])('a text %s', (_, before, value, after) => {
    const text = (title: string) => `stoplog: 1\nstudy:\n  title: ${title}\n  id: a\n`;
    expect(edited(text(before), { field: ['study', 'title'], value })).toBe(text(after));
  });
});

describe('a figure that is not there yet', () => {
  it.each([
    ['after its siblings in brackets', '{kge: 0.8}', '{kge: 0.8, nse: 0.7}'],
    ['in empty brackets', '{}', '{nse: 0.7}'],
    ['before a last comma', '{kge: 0.8,}', '{kge: 0.8, nse: 0.7,}'],
    [
      'in brackets over several lines',
      '{\n        kge: 0.8 # a\n      }',
      '{\n        kge: 0.8, nse: 0.7 # a\n      }',
    ],
    ['on a line of its own', '\n        kge: 0.8 # a', '\n        kge: 0.8 # a\n        nse: 0.7'],
  ])('is put %s', (_, before, after) => {
    expect(edited(scores(before), { field: nse, value: 0.7 })).toBe(scores(after));
  });

  it('keeps the decimals that it was rounded to, and so does one that stood there with fewer', () => {
    const rounded = { value: 1, decimals: 2 };
    const both = [
      { field: kge, value: rounded },
      { field: nse, value: { value: -0.5, decimals: 3 } },
    ];
    expect(edited(scores('{kge: 1}'), ...both)).toBe(scores('{kge: 1.00, nse: -0.500}'));
  });

  it('comes with its sibling, in one map', () => {
    const text = 'stoplog: 1\nevaluation: {q: {step: P1D}}\n';
    expect(edited(text, { field: nse, value: 0.7 }, { field: kge, value: 0.8 })).toBe(
      'stoplog: 1\nevaluation: {q: {step: P1D, scores: {validation: {nse: 0.7, kge: 0.8}}}}\n',
    );
  });

  it('is put at the end of a text without a last line end, and after a text on lines of its own', () => {
    const field = ['study', 'id'];
    expect(edited('stoplog: 1\nstudy:\n  title: a', { field, value: 'b' })).toBe(
      'stoplog: 1\nstudy:\n  title: a\n  id: b',
    );
    expect(edited('stoplog: 1\nstudy:\n  title: |\n    a\nmodel: {}\n', { field, value: 'b' })).toBe(
      'stoplog: 1\nstudy:\n  title: |\n    a\n  id: b\nmodel: {}\n',
    );
  });

  it('is put with the line ends of the file', () => {
    expect(edited('stoplog: 1\r\nstudy:\r\n  title: a\r\n', { field: ['study', 'id'], value: 'b' })).toBe(
      'stoplog: 1\r\nstudy:\r\n  title: a\r\n  id: b\r\n',
    );
  });

  it('is put into an entry of a list', () => {
    const text = 'stoplog: 1\nparameters:\n  values:\n    - name: a\n      value: 1\n    - name: b\n';
    expect(edited(text, { field: ['parameters', 'values', 1, 'value'], value: 2 })).toBe(
      `${text}      value: 2\n`,
    );
  });
});

describe('a figure that can’t be written', () => {
  it.each([
    ['behind an alias', 'evaluation: {q: {scores: {calibration: &s {nse: 1}, validation: *s}}}', nse],
    ['where a map stands', 'evaluation: {q: {scores: {validation: {}}}}', nse.slice(0, -1)],
    ['below a figure', 'catchment: {area: {value: 3, unit: km2}}', ['catchment', 'area', 'value', 'nse']],
  ])('%s is refused, with its line', (_, text, field) => {
    const write = () => edited(`stoplog: 1\n${text}\n`, { field, value: 1 });
    expect(write).toThrow(Failure);
    expect(write).toThrow(/^stoplog\.yaml:2: /);
  });
});

describe('whatever is written', () => {
  const sound = readFileSync('tests/harness/sound.yaml', 'utf8');
  const plain = parseDocument(sound, { schema: 'core' });

  const scalars: FieldPath[] = [];
  const collect = (value: unknown, field: FieldPath): void => {
    if (typeof value === 'object' && value !== null) {
      for (const [key, item] of Object.entries(value))
        collect(item, [...field, Array.isArray(value) ? Number(key) : key]);
    } else scalars.push(field);
  };
  collect(plain.toJS(), []);

  const value = fc.oneof(
    fc.double({ noNaN: true, noDefaultInfinity: true }).map((figure) => figure + 0), // no -0
    fc.integer(),
    fc.boolean(),
    fc.string({ unit: 'grapheme' }),
  );
  const edits = fc.uniqueArray(fc.record({ field: fc.constantFrom(...scalars), value }), {
    maxLength: 20,
    selector: ({ field }) => JSON.stringify(field),
  });

  /** The text without the values of some fields, as a parser of its own finds them. */
  function around(text: string, fields: readonly FieldPath[]): string {
    const document = parseDocument(text, { schema: 'core' });
    const ranges = fields
      .map((field) => {
        const node = document.getIn(field, true);
        if (!isScalar(node) || node.range == null) throw new Error(`no scalar at ${field.join('.')}`);
        return node.range;
      })
      .sort((a, b) => b[0] - a[0]);
    return ranges.reduce((rest, [start, end]) => rest.slice(0, start) + rest.slice(end), text);
  }

  test.each(['\n', '\r\n'])(
    'no byte changes but the values’ own, and they say what they should (line end %j)',
    (lineEnd) => {
      const text = sound.replaceAll('\n', lineEnd);
      const manifest = manifestOf(text);
      fc.assert(
        fc.property(edits, (list) => {
          const after = replaceScalars(manifest, list);
          const fields = list.map(({ field }) => field);
          const expected = parseDocument(text, { schema: 'core' });
          for (const { field, value } of list) expected.setIn(field, value);
          expect(parseDocument(after, { schema: 'core' }).toJS()).toEqual(expected.toJS());
          expect(around(after, fields)).toBe(around(text, fields));
        }),
        { numRuns: 60 },
      );
    },
  );
});
