import { describe, expect, it } from 'vitest';
import { schema, syntax } from '../../tests/harness/single-faults.ts';
import type { Problem } from './manifest.ts';
import { readManifest } from './read.ts';

const problemsOf = (text: string): readonly Problem[] => readManifest('stoplog.yaml', text).problems;

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
