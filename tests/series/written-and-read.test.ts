import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dayNumber, formatDate } from '../../src/series/calendar.ts';
import type { SeriesLayout } from '../../src/series/layout.ts';
import { isNoPlausibleValue } from '../../src/series/missing-codes.ts';
import { Rows } from '../../src/series/rows.ts';
import { plain, problemsOf, read } from './told.ts';

const separators = { comma: ',', semicolon: ';', tab: '\t', blank: '   ' } as const;

const manner = fc.record({
  separator: fc.constantFrom('comma', 'semicolon', 'tab', 'blank'),
  decimal: fc.constantFrom('point', 'comma'),
  quoting: fc.constantFrom('never', 'always', 'sometimes'),
  lineEnd: fc.constantFrom('\n', '\r\n', '\r'),
  mark: fc.constantFrom('', '\uFEFF'),
});

const value = fc.oneof(
  fc.constant(null),
  fc.double({ noNaN: true, noDefaultInfinity: true }).filter((number) => !isNoPlausibleValue(number)),
  fc.integer({ min: -99_999, max: 99_999 }).map((number) => number / 1000),
);

const rows = fc.array(fc.tuple(value, value), { minLength: 1, maxLength: 40 });

describe('what was written is what is read', () => {
  it('for every separator, decimal mark, quoting and line end', async () => {
    await fc.assert(
      fc.asyncProperty(manner, rows, async ({ separator, decimal, quoting, lineEnd, mark }, data) => {
        let field = 0;
        const write = (text: string) => {
          const clash = decimal === 'comma' && separator === 'comma' && text.includes(',');
          return quoting === 'always' || clash || (quoting === 'sometimes' && field++ % 3 === 0)
            ? `"${text}"`
            : text;
        };
        const number = (one: number | null) =>
          one === null ? 'NA' : decimal === 'comma' ? String(one).replace('.', ',') : String(one);
        const first = dayNumber(1999, 12, 1);
        const lines = [
          ['date', 'flow', 'level'],
          ...data.map(([flow, level], day) => [formatDate(first + day), number(flow), number(level)]),
        ].map((line) => line.map(write).join(separators[separator]));
        const layout: SeriesLayout = {
          ...plain,
          values: ['flow', 'level'],
          separator,
          decimal,
          missing: ['NA'],
        };
        const table = await read(`${mark}${lines.join(lineEnd)}${lineEnd}`, layout);
        expect(problemsOf(table)).toEqual([]);
        expect(table.absent.total + table.outOfOrder.total + table.repeated.total).toBe(0);
        for (const [place, column] of table.columns.entries()) {
          // `+ 0` because a written -0 is read as -0 and both mean nothing.
          expect(Array.from(column.values, (read) => read + 0)).toEqual(
            data.map((row) => (row[place] ?? Number.NaN) + 0),
          );
          expect(column.missing).toBe(data.filter((row) => row[place] === null).length);
        }
      }),
      { numRuns: 300 },
    );
  });

  it('for quoted texts, as csv-parse reads them', () => {
    const text = fc.string({
      unit: fc.constantFrom('"', ',', '\n', '\r\n', ' ', 'a', 'ü', '°'),
      maxLength: 6,
    });
    const table = fc.array(fc.array(text, { minLength: 2, maxLength: 2 }), { minLength: 1, maxLength: 5 });
    fc.assert(
      fc.property(table, fc.integer({ min: 1, max: 9 }), (data, size) => {
        const written = data
          .map((row) => row.map((field) => `"${field.replaceAll('"', '""')}"`).join(','))
          .join('\n');
        const theirs: string[][] = parse(written, { relaxColumnCount: true });
        expect(theirs).toEqual(data);
        expect(rowsIn(written, size)).toEqual(theirs);
      }),
      { numRuns: 300 },
    );
  });
});

function rowsIn(text: string, chunk: number): string[][] {
  const rows = new Rows('comma', undefined);
  const bytes = Buffer.from(text);
  const found: string[][] = [];
  const collect = () => {
    while (rows.next()) found.push(Array.from({ length: rows.count }, (_, field) => rows.text(field)));
  };
  for (let at = 0; at < bytes.length; at += chunk) {
    rows.take(bytes.subarray(at, at + chunk));
    collect();
  }
  rows.end();
  collect();
  return found;
}
