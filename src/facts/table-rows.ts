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

type Layout = Omit<TableFile, 'file'>;
type RowsOrReason = readonly TableRow[] | string;

const tablesOf = new WeakMap<Snapshot, Map<string, Promise<RowsOrReason>>>();

/**
 * The rows of a table (path from the top of the repository); a text says why it can't be read. Once for all who ask within a
 * run, as many records may share a table.
 */
export function readTable(path: string, layout: Layout, snapshot: Snapshot): Promise<RowsOrReason> {
  const { separator, decimal, skip_lines, comment } = layout;
  const tables = tablesOf.get(snapshot) ?? new Map<string, Promise<RowsOrReason>>();
  tablesOf.set(snapshot, tables);
  const key = JSON.stringify([path, separator, decimal, skip_lines, comment]);
  const table = tables.get(key) ?? read(path, layout, snapshot);
  tables.set(key, table);
  return table;
}

async function read(
  path: string,
  { separator = 'comma', decimal = 'point', skip_lines = 0, comment }: Layout,
  snapshot: Snapshot,
): Promise<RowsOrReason> {
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
