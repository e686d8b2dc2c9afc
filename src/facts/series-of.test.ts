import { describe, expect, it } from 'vitest';
import { isDefined } from '../hydrology/paired.ts';
import type { InputReference } from '../manifest/data.generated.ts';
import { readManifest } from '../manifest/read.ts';
import { buildRecords } from '../records/build.ts';
import { type FilesInMemory, snapshotFromMemory } from '../repository/memory.ts';
import { seriesOfFile, seriesOfInput } from './series-of.ts';

const files: FilesInMemory = {
  'study/a.csv': 'date,rain,snow\n2001-01-01,1,5\n2001-01-02,NA,6\n2001-01-03,3,7\n',
  'study/b.csv': 'date,rain,snow\n2001-01-01,3,1\n2001-01-02,4,2\n2001-01-03,9,3\n',
  'study/2001.csv': 'date,rain,snow\n2001-01-04,8,0\n',
};
const series = '{time: date, values: rain, unit: mm/d, step: P1D, missing: [NA]}';

/** Values of the series that a reference to the input stands for, or the reason why there are none. */
async function valuesOf(input: string, reference: Partial<InputReference> = {}) {
  const text = `stoplog: 1\ninputs:\n  rainfall: {role: precipitation, ${input}}\n`;
  const { manifest, problems } = readManifest('study/stoplog.yaml', text);
  if (manifest === null) throw new Error(JSON.stringify(problems));
  const snapshot = snapshotFromMemory({ ...files, 'study/stoplog.yaml': text });
  const records = await buildRecords(manifest, snapshot);
  const found = await seriesOfInput({ input: 'rainfall', ...reference }, records, snapshot);
  return isDefined(found) ? [...found.value.values] : found.undefined;
}

describe('the series that an input stands for', () => {
  it.each([
    ['one file', `files: [a.csv], series: ${series}`, [1, Number.NaN, 3]],
    ['files in turn', `files: [2001.csv, a.csv], series: ${series}`, [1, Number.NaN, 3, 8]],
    [
      'a mean, where both have a value',
      `files: [a.csv, b.csv], combine: mean, series: ${series}`,
      [2, Number.NaN, 6],
    ],
    ['a sum', `files: [a.csv, b.csv], combine: sum, series: ${series}`, [4, Number.NaN, 12]],
    [
      'a weighted mean by path',
      `files: [a.csv, b.csv], combine: {weights: {a.csv: 3, b.csv: 1}}, series: ${series}`,
      [1.5, Number.NaN, 4.5],
    ],
    ['one file whose mean it is', `files: [b.csv], combine: mean, series: ${series}`, [3, 4, 9]],
    [
      'a sum of columns',
      `files: [b.csv], combine: sum, series: {time: date, values: [rain, snow], unit: mm/d, step: P1D}`,
      [4, 6, 12],
    ],
    [
      'a weighted mean by entry',
      `each: [a, b], files: ["{each}.csv"], combine: {weights: {a: 0, b: 2}}, series: ${series}`,
      [3, 4, 9],
    ],
  ])('is %s', async (_, input, expected) => expect(await valuesOf(input)).toEqual(expected));

  it('is the file and column that are named', async () => {
    const input = `files: [a.csv, b.csv], combine: mean, series: ${series}`;
    expect(await valuesOf(input, { file: 'b.csv' })).toEqual([3, 4, 9]);
    expect(await valuesOf(input, { file: 'b.csv', values: 'snow' })).toEqual([1, 2, 3]);
  });

  it.each([
    [
      'columns that stand each for itself',
      `files: [a.csv], combine: each, series: {time: date, values: [rain, snow]}`,
      {},
      /holds 2 series/,
    ],
    ['columns', `files: [a.csv], series: {time: date, values: [rain, snow]}`, {}, /holds 2 series/],
    [
      'files that stand each for itself',
      `files: [a.csv, b.csv], combine: each, series: ${series}`,
      {},
      /holds 2 series/,
    ],
    ['entries', `each: [a, b], files: ["{each}.csv"], series: ${series}`, {}, /holds 2 series/],
    ['another file', `files: [a.csv], series: ${series}`, { file: 'c.csv' }, /no file c.csv/],
    ['another input', `files: [a.csv], series: ${series}`, { input: 'snow' }, /inputs.snow has no file/],
    ['no such column', `files: [a.csv], series: ${series}`, { values: 'hail' }, /can't be read/],
    [
      'no series',
      'files: [a.csv]',
      {},
      /^inputs\.rainfall does not say under `series` how study\/a\.csv is to be read$/,
    ],
    [
      'another layout',
      'files: [a.csv], series: {time: day, values: rain, unit: mm/d, step: P1D}',
      {},
      /a\.csv can't be read/,
    ],
  ])('is none: %s', async (_, input, reference, reason) => {
    expect(await valuesOf(input, reference)).toMatch(reason);
  });
});

describe('a file', () => {
  it('is read once for all who ask, and again for another layout', async () => {
    const snapshot = snapshotFromMemory(files);
    let streams = 0;
    const counted = {
      ...snapshot,
      stream(path: string) {
        streams++;
        return snapshot.stream(path);
      },
    };
    const layout = { time: 'date', values: 'rain', missing: ['NA'], step: 'P1D' };
    const [one, other] = await Promise.all([
      seriesOfFile('study/a.csv', layout, counted),
      seriesOfFile('study/a.csv', { ...layout }, counted),
    ]);
    expect(one).toBe(other);
    expect(streams).toBe(1);
    await seriesOfFile('study/a.csv', { ...layout, values: 'snow' }, counted);
    expect(streams).toBe(2);
    expect(await seriesOfFile('study/none.csv', layout, counted)).toBeNull();
  });
});
