import { describe, expect, it } from 'vitest';
import { readSeries } from '../../src/series/read.ts';
import { awkward, twoDays } from './awkward-files.ts';
import { piecesOf, plain, problemsOf, read, rowsOf } from './told.ts';

describe('files as modellers have them', () => {
  for (const { name, text, layout = plain, rows = twoDays } of awkward)
    it(name, async () => {
      const table = await read(text, layout);
      expect(problemsOf(table)).toEqual([]);
      expect(rowsOf(table)).toEqual(rows);
      expect(table.repeated.total + table.outOfOrder.total + table.offStep.total).toBe(0);
    });

  it('are read alike whatever the size of the chunks', async () => {
    for (const { text, layout = plain, rows = twoDays } of awkward) {
      const bytes = Buffer.from(text);
      for (const size of [1, 2, 3, 7]) {
        const reused = size % 2 === 0 ? new Uint8Array(size) : Buffer.alloc(size);
        const table = await readSeries(piecesOf(bytes, reused), layout, 'flow.csv');
        expect(rowsOf(table)).toEqual(rows);
        expect(problemsOf(table)).toEqual([]);
      }
    }
  });
});
