import { type PrintedNumber, printedNumber } from '../../hydrology/stated/printed-number.ts';
import type { RecordNode, Records } from '../../records/record.ts';
import type { Snapshot } from '../../repository/snapshot.ts';
import { findOutput } from '../output.ts';
import { readTable } from '../table-rows.ts';

/** A share of missing values that stands in a table. */
export interface ShareInTable {
  /** With the decimals that are written. */
  readonly printed: PrintedNumber;
  /** From the top of the repository, and the line from 1. */
  readonly file: string;
  readonly line: number;
}

/** The share in the row that names an input or its entry in the first column; null where the input names no table, or it has no such row. */
export async function shareInTable(
  { name, fragment }: RecordNode<'inputs'>,
  records: Records,
  snapshot: Snapshot,
): Promise<ShareInTable | null> {
  const { missing_share: share } = fragment;
  if (typeof share !== 'object' || !('table' in share)) return null;
  const layout = typeof share.table === 'string' ? { file: share.table } : share.table;
  const found = await findOutput(layout, records, snapshot);
  if ('undefined' in found) return null;
  const file = found.value.path;
  const rows = await readTable(file, layout, snapshot);
  if (typeof rows === 'string') return null;
  for (const { line, first, cell } of rows) {
    const printed = printedNumber(cell('missing_share') ?? '');
    if (printed !== null && (first === name || name?.endsWith(`.${first}`))) return { printed, file, line };
  }
  return null;
}
