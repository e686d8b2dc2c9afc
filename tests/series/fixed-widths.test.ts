import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { SeriesLayout } from '../../src/series/layout.ts';
import { readSeries } from '../../src/series/read.ts';
import { Rows } from '../../src/series/rows.ts';

const bytes = (text: string) => new TextEncoder().encode(text);

describe('a file of fixed columns', () => {
  // Invented output of a model that writes years, months and two fluxes into 4, 3, 9 and 9 characters.
  const layout: SeriesLayout = {
    time: { year: 1, month: 2 },
    values: [3, 4],
    widths: [4, 3, 9, 9],
    header: false,
    missing: ['', -999.99],
    step: 'P1M',
    unit: 't',
  };
  const read = (text: string, more: SeriesLayout = {}) =>
    readSeries([bytes(text)], { ...layout, ...more }, 'out.txt');

  it('is read though no blank stands between the columns', async () => {
    const table = await read('2004 10123456.78  -12.50\n2004 11-99999.12123456.78\n');
    expect(table.columns.map(({ values }) => [...values])).toEqual([
      [123456.78, -99999.12],
      [-12.5, 123456.78],
    ]);
    expect(table.problems.total).toBe(0);
  });

  it('has empty cells where a line ends early, and missing codes', async () => {
    const table = await read('2004 10     1.50\n2004 11  -999.99     2.50\n');
    expect(table.columns.map(({ values }) => [...values])).toEqual([
      [1.5, Number.NaN],
      [Number.NaN, 2.5],
    ]);
  });

  it('may have a line of names, cut alike', async () => {
    const table = await read('YEARMON FLOW_T    LOAD\n2004 10     1.50     2.50\n', {
      time: { year: 'YEAR', month: 'MON' },
      values: ['LOAD'],
      header: true,
    });
    expect(table.columns).toMatchObject([{ name: 'LOAD', values: Float64Array.of(2.5) }]);
  });

  it('tells of what stands beyond the last column', async () => {
    const table = await read('2004 10     1.50     2.50\n2004 11     1.50     2.50 9\n');
    expect(table.problems.first).toMatchObject([{ line: 2, expected: '4 columns', found: '5' }]);
    expect(table.timeSeconds).toHaveLength(1);
  });

  it('tells of widths that cut through a number', async () => {
    const table = await read('2004 10     1.50     2.50\n', { widths: [4, 3, 10, 8], missing: [] });
    expect(table.columns.map(({ values }) => values[0])).toEqual([1.5, 2.5]);
    const cut = await read('2004 10     1.50     2.50\n', { widths: [4, 3, 7, 11] });
    expect(cut.problems.total + cut.timeSeconds.length).toBe(1);
    expect(cut.problems.first).toMatchObject([{ line: 1, found: '"50 2.50"' }]);
  });

  it('gives back every text that was set into it, whatever the chunks', () => {
    const text = fc.string({ unit: fc.constantFrom('a', '7', '"', ',', 'ü', '°', '-'), maxLength: 5 });
    const table = fc.array(fc.array(text, { minLength: 3, maxLength: 3 }), { minLength: 1, maxLength: 5 });
    fc.assert(
      fc.property(
        table,
        fc.integer({ min: 1, max: 9 }),
        fc.constantFrom('\n', '\r\n', '\r'),
        (data, size, end) => {
          const rows = new Rows('comma', undefined, [5, 6, 5]);
          const widths = [5, 6, 5];
          const lines = data.map((row) => row.map((cell, place) => cell.padEnd(widths[place] ?? 0)).join(''));
          const whole = bytes(lines.join(end));
          const found: string[][] = [];
          const collect = () => {
            while (rows.next()) found.push([0, 1, 2].map((field) => rows.text(field)));
          };
          for (let at = 0; at < whole.length; at += size) {
            rows.take(whole.subarray(at, at + size));
            collect();
          }
          rows.end();
          collect();
          const shown = data.filter((row) => row.join('') !== '');
          expect(found).toEqual(shown.map((row) => row.map((cell) => cell.replaceAll('""', '"'))));
        },
      ),
      { numRuns: 300 },
    );
  });
});
