import type { TableFile } from '../manifest/data.generated.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { Rows } from '../series/rows.ts';

/** One row of a table below its line of column names. */
export interface TableRow {
  /** From 1. */
  readonly line: number;
  /** What stands in the first column, by which a row is told from others. */
  readonly first: string;
  /** The text below a column's name; decimal commas as points. Undefined where the table has no such column. */
  cell(column: string): string | undefined;
}

/** No table of single figures is larger. */
const largestBytes = 16 * 2 ** 20;

/** The rows of a table (path from the top of the repository); a text says why it can't be read. */
export async function readTable(
  path: string,
  { separator = 'comma', decimal = 'point', skip_lines = 0, comment }: Omit<TableFile, 'file'>,
  snapshot: Snapshot,
): Promise<readonly TableRow[] | string> {
  const content = await snapshot.read(path, largestBytes);
  if (content === null) return 'no content here';
  const rows = new Rows(separator, comment);
  rows.take(content);
  rows.end();
  for (let line = 0; line < skip_lines; line++) rows.skip();
  if (!rows.next()) return rows.foreign ?? 'nothing in it';
  const names = cellsOf(rows);
  const found: TableRow[] = [];
  while (rows.next()) {
    const cells = cellsOf(rows);
    found.push({
      line: rows.line,
      first: cells[0] ?? '',
      cell(column) {
        const text = names.includes(column) ? (cells[names.indexOf(column)] ?? '') : undefined;
        return decimal === 'comma' && /^[-+\d]*,\d+$/.test(text ?? '') ? text?.replace(',', '.') : text;
      },
    });
  }
  return found;
}

function cellsOf(rows: Rows): readonly string[] {
  return Array.from({ length: rows.count }, (_, field) => rows.text(field));
}
