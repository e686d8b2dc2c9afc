import type { SeriesLayout } from './layout.ts';
import { planOf } from './plan.ts';
import { RowReader } from './row-reader.ts';
import type { SeriesTable } from './table.ts';
import { TableBuilder } from './table-builder.ts';

/**
 * Reads a file of a time series as its layout says. Never throws for what is in the file: rows that don't fit the layout are
 * left out of the table and named in its `problems`; where the layout itself can't be used the table is empty and a problem says
 * why. Chunks may be of any size, and be overwritten once the next one is asked for.
 */
export async function readSeries(
  chunks: AsyncIterable<Uint8Array> | Iterable<Uint8Array>,
  layout: SeriesLayout,
  fileName: string,
): Promise<SeriesTable> {
  const plan = planOf(layout);
  if (typeof plan === 'string') {
    const empty = new TableBuilder(0);
    empty.problems.add({ line: null, column: null, expected: 'a usable layout', found: plan, advice: '' });
    return empty.table({ file: fileName, unit: layout.unit ?? '', step: null, names: [] });
  }
  const reader = new RowReader(plan, layout);
  let goesOn = true;
  for await (const chunk of chunks) {
    reader.rows.take(chunk);
    goesOn = reader.readOn();
    if (!goesOn) break;
  }
  if (goesOn) reader.close();
  return reader.finish(fileName);
}
