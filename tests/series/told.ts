import type { SeriesLayout } from '../../src/series/layout.ts';
import { readSeries } from '../../src/series/read.ts';
import { formatTime, irregular } from '../../src/series/step.ts';
import type { SeriesTable } from '../../src/series/table.ts';
import { tellProblem } from '../../src/series/tell.ts';

export const plain: SeriesLayout = { time: 'date', values: 'flow', step: 'P1D' };

export function read(text: string | Uint8Array, layout: SeriesLayout): Promise<SeriesTable> {
  return readSeries([typeof text === 'string' ? Buffer.from(text) : text], layout, 'flow.csv');
}

/** `2010-01-01 1.5` for each row and column, `-` where missing. */
export function rowsOf(table: SeriesTable): string[] {
  return Array.from(table.timeSeconds, (time, row) =>
    [
      formatTime(time, table.step ?? irregular),
      ...table.columns.map(({ values }) => (Number.isNaN(values[row]) ? '-' : String(values[row]))),
    ].join(' '),
  );
}

export function problemsOf(table: SeriesTable): string[] {
  return table.problems.first.map((problem) => tellProblem(table.file, problem));
}

/** Chunks that overwrite one another, as a reader of files hands them out. */
export async function* piecesOf(bytes: Uint8Array, reused: Uint8Array): AsyncGenerator<Uint8Array> {
  for (let at = 0; at < bytes.length; at += reused.length) {
    const piece = bytes.subarray(at, at + reused.length);
    reused.fill(0x3f);
    reused.set(piece);
    yield reused.subarray(0, piece.length);
  }
}
