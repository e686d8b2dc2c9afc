import type { Parameters } from '../../manifest/data.generated.ts';
import type { Manifest } from '../../manifest/manifest.ts';
import type { Snapshot } from '../../repository/snapshot.ts';
import { numberOf, point } from '../../series/number-text.ts';
import { findOutput } from '../output.ts';
import { readTable, type TableRow } from '../table-rows.ts';

/** A project's own table of the values that classes usually have. */
export interface OwnTable {
  readonly source: string;
  /** `1` unless stated. */
  readonly unit: string;
  readonly rows: readonly OwnClass[];
  /** Why it can't be read, as a sentence; null where it can. */
  readonly problem: string | null;
}

export interface OwnClass {
  readonly class: string;
  /** Null where the row holds for every soil group. */
  readonly soilGroup: string | null;
  readonly low: number;
  readonly high: number;
}

/** By name. */
export async function ownTables(
  stated: Parameters['handbook_tables'],
  manifest: Manifest,
  snapshot: Snapshot,
): Promise<ReadonlyMap<string, OwnTable>> {
  const found = new Map<string, OwnTable>();
  for (const [name, { table, unit = '1', source }] of Object.entries(stated ?? {})) {
    const layout = typeof table === 'string' ? { file: table } : table;
    const place = await findOutput(layout, { manifest }, snapshot);
    const read = 'undefined' in place ? place.undefined : await readTable(place.value.path, layout, snapshot);
    const classes = typeof read === 'string' ? read : classesIn(read, layout.file);
    found.set(name, {
      source,
      unit,
      rows: typeof classes === 'string' ? [] : classes,
      problem: typeof classes === 'string' ? classes : null,
    });
  }
  return found;
}

/** A text says which row is none. */
function classesIn(rows: readonly TableRow[], file: string): readonly OwnClass[] | string {
  const classes: OwnClass[] = [];
  for (const { line, cell } of rows) {
    const name = cell('class')?.trim() ?? '';
    const [low = Number.NaN, high = Number.NaN] = ['low', 'high'].map((column) =>
      numberOf(cell(column) ?? '', point),
    );
    if (name === '' || !(low <= high))
      return `${file} line ${line}: expected a class, and numbers \`low\` and \`high\` in that order`;
    classes.push({ class: name, soilGroup: cell('soil_group')?.trim() || null, low, high });
  }
  return classes;
}
