import type { Handbook, ParameterValue } from '../../manifest/data.generated.ts';
import type { FieldPath, Manifest } from '../../manifest/manifest.ts';
import type { RecordNode } from '../../records/record.ts';
import type { Snapshot } from '../../repository/snapshot.ts';
import { numberOf, point } from '../../series/number-text.ts';
import { findOutput } from '../output.ts';
import type { UnreadRow } from '../scores/stated.ts';
import { readTable, type TableRow } from '../table-rows.ts';

/** A parameter as the record, or its table, states it. */
export interface StatedParameter {
  readonly parameter: ParameterValue;
  /** Its name, with layer and scope where the record has several of that name. */
  readonly label: string;
  /** In the manifest: its entry, or the table that holds it. */
  readonly field: FieldPath;
  /** Where it stands in a table: path from the top of the repository, line from 1. */
  readonly at: { readonly file: string; readonly line: number } | null;
  /** The final value as it is written, with its decimals; null where it is not stated. */
  readonly written: string | null;
}

/** Parameters that could be read, and rows of the table that could not. */
export interface ReadParameters {
  readonly values: readonly StatedParameter[];
  readonly unread: readonly UnreadRow[];
}

type Unlabelled = Omit<StatedParameter, 'label'>;

/** The parameters in the record itself, then those in its table. */
export async function statedParameters(
  record: RecordNode<'parameters'>,
  manifest: Manifest,
  snapshot: Snapshot,
): Promise<ReadParameters> {
  const inManifest = (record.fragment.values ?? []).map((parameter, index): Unlabelled => {
    const field = ['parameters', 'values', index];
    const written = manifest.source([...field, 'value']);
    return {
      parameter,
      field,
      at: null,
      written: written ?? (parameter.value === undefined ? null : String(parameter.value)),
    };
  });
  const inTable = await parametersInTable(record, manifest, snapshot);
  const all = [...inManifest, ...inTable.values];
  const times = new Map<string, number>();
  for (const { parameter } of all) times.set(parameter.name, (times.get(parameter.name) ?? 0) + 1);
  return {
    values: all.map((one) => ({
      ...one,
      label: labelOf(one.parameter, (times.get(one.parameter.name) ?? 0) > 1),
    })),
    unread: inTable.unread,
  };
}

function labelOf({ name, layer, scope }: ParameterValue, isRepeated: boolean): string {
  const where = [scope, layer === undefined ? undefined : `layer ${layer}`].filter(
    (part) => part !== undefined,
  );
  return isRepeated && where.length > 0 ? `${name} (${where.join(', ')})` : name;
}

async function parametersInTable(
  { fragment: { table } }: RecordNode<'parameters'>,
  manifest: Manifest,
  snapshot: Snapshot,
): Promise<{ readonly values: readonly Unlabelled[]; readonly unread: readonly UnreadRow[] }> {
  if (table === undefined) return { values: [], unread: [] };
  const layout = typeof table === 'string' ? { file: table } : table;
  const found = await findOutput(layout, { manifest }, snapshot);
  // A file that is not there has its own finding.
  if ('undefined' in found) return { values: [], unread: [] };
  const { path: file } = found.value;
  const rows = await readTable(file, layout, snapshot);
  if (typeof rows === 'string')
    return { values: [], unread: [{ file, line: 1, expected: 'a table', found: rows }] };
  if (rows.length === 0)
    return { values: [], unread: [{ file, line: 1, expected: 'a row for each parameter', found: 'none' }] };
  const field = ['parameters', 'table'];
  const values: Unlabelled[] = [];
  const unread: UnreadRow[] = [];
  for (const row of rows) {
    const { line } = row;
    const read = parameterIn(row);
    if ('expected' in read) unread.push({ ...read, file, line });
    else values.push({ parameter: read, field, at: { file, line }, written: textIn(row, 'value') ?? null });
  }
  return { values, unread };
}

type Problem = Pick<UnreadRow, 'expected' | 'found'>;

const numbers = ['initial', 'by', 'value', 'range_low', 'range_high', 'impervious_share'] as const;
const texts = ['unit', 'range_from', 'scope', 'layer'] as const;
const choices = {
  change: ['set', 'shift', 'scale'],
  range_of: ['value', 'factor'],
  search: ['linear', 'log'],
  calibrated: ['true', 'false'],
  soil_group: ['A', 'B', 'C', 'D'],
} as const;

/** A row's parameter; what is wrong with the row where it holds none. Empty cells say nothing. */
function parameterIn(row: TableRow): ParameterValue | Problem {
  const name = textIn(row, 'name');
  if (name === undefined)
    return { expected: 'a parameter’s name', found: row.cell('name') ?? 'no column `name`' };
  const said: Record<string, string | number> = {};
  for (const column of numbers) {
    const text = textIn(row, column);
    if (text === undefined) continue;
    const number = numberOf(text, point);
    if (Number.isNaN(number)) return { expected: `a number in \`${column}\``, found: text };
    said[column] = number;
  }
  for (const [column, known] of Object.entries(choices)) {
    const text = textIn(row, column);
    if (text === undefined) continue;
    if (!(known as readonly string[]).includes(text))
      return { expected: `${known.join(', ')} in \`${column}\``, found: text };
    said[column] = text;
  }
  for (const column of texts) {
    const text = textIn(row, column);
    if (text !== undefined) said[column] = text;
  }
  const { range_low: low, range_high: high, impervious_share, soil_group, calibrated, ...rest } = said;
  const handbook = handbookIn(row, { impervious_share, soil_group });
  return {
    name,
    ...rest,
    ...(low === undefined || high === undefined ? {} : { range: [low, high] as [number, number] }),
    ...(calibrated === undefined ? {} : { calibrated: calibrated === 'true' }),
    ...(handbook === undefined ? {} : { handbook }),
  };
}

function handbookIn(row: TableRow, more: Record<string, string | number | undefined>): Handbook | undefined {
  const table = textIn(row, 'handbook_table');
  if (table === undefined) return undefined;
  const name = textIn(row, 'handbook_class');
  const stated = Object.entries(more).filter(([, value]) => value !== undefined);
  return { table, ...(name === undefined ? {} : { class: name }), ...Object.fromEntries(stated) };
}

function textIn(row: TableRow, column: string): string | undefined {
  const text = row.cell(column)?.trim();
  return text === '' ? undefined : text;
}
