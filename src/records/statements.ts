import type { EachTable, ManifestData } from '../manifest/data.generated.ts';
import type { FieldPath, Manifest } from '../manifest/manifest.ts';
import { fileOfTable, namesInTable } from './each-table.ts';
import { type Area, areas, type FragmentOf, namedAreas } from './record.ts';

/** What a manifest states as one record, before its files and what it rests on are known. */
export interface StatementIn<A extends Area> {
  readonly id: string;
  readonly area: A;
  readonly name: string | null;
  readonly fragment: FragmentOf[A];
  readonly field: FieldPath;
}

/** Told apart by `area`. */
export type Statement = { [A in Area]: StatementIn<A> }[Area];

/** A manifest and the records that it states, by id. */
export interface Stated {
  readonly manifest: Manifest;
  readonly statements: ReadonlyMap<string, Statement>;
}

/** A table that lists what a record is repeated for. */
export interface NamedTable {
  /** The id that the record would have if it were not repeated. */
  readonly record: string;
  readonly pattern: string;
  readonly field: FieldPath;
}

/**
 * The records of a manifest, in its order. A fragment with `each` makes one record for each entry: `inputs.gauge`
 * with `each: [g1, g2]` makes `inputs.gauge.g1` and `inputs.gauge.g2`, with `{each}` in its texts replaced. `read`
 * gives the text of a table that lists entries, or null where there is none.
 */
export async function statementsOf(
  manifest: Manifest,
  read: (pattern: string) => Promise<string | null>,
): Promise<Stated & { readonly tables: readonly NamedTable[] }> {
  const statements = new Map<string, Statement>();
  const tables: NamedTable[] = [];
  const add = (area: Area, name: string | null, fragment: object, field: FieldPath): void => {
    const id = name === null ? area : `${area}.${name}`;
    statements.set(id, { id, area, name, fragment, field } as Statement);
  };
  for (const { area, name, fragment, field } of fragmentsOf(manifest.data)) {
    if (name === null || !isRepeated(fragment)) {
      add(area, name, fragment, field);
      continue;
    }
    const { each, ...common } = fragment;
    let entries: readonly string[] = [];
    if ('table' in each) {
      const table = { record: `${area}.${name}`, ...fileOfTable(each.table, [...field, 'each', 'table']) };
      tables.push(table);
      entries = namesInTable((await read(table.pattern)) ?? '', each.table);
    } else entries = each;
    for (const entry of entries) add(area, `${name}.${entry}`, filledIn(common, entry), field);
  }
  return { manifest, statements, tables };
}

interface Fragment {
  readonly area: Area;
  readonly name: string | null;
  readonly fragment: object;
  readonly field: FieldPath;
}

function fragmentsOf(data: ManifestData): readonly Fragment[] {
  const stated = Object.keys(data).filter((key): key is Area => (areas as readonly string[]).includes(key));
  return stated.flatMap((area): readonly Fragment[] => {
    const section = area === 'scenarios' ? data.scenarios?.cases : data[area];
    const field = area === 'scenarios' ? ['scenarios', 'cases'] : [area];
    if (!(namedAreas as readonly Area[]).includes(area))
      return [{ area, name: null, fragment: section ?? {}, field }];
    return Object.entries(section ?? {}).map(([name, fragment]) => ({
      area,
      name,
      fragment: fragment as object,
      field: [...field, name],
    }));
  });
}

function isRepeated(fragment: object): fragment is { readonly each: readonly string[] | EachTable } {
  return 'each' in fragment;
}

function filledIn<Value>(value: Value, entry: string): Value {
  const filled = (inner: unknown): unknown => {
    if (typeof inner === 'string') return inner.replaceAll('{each}', () => entry);
    if (Array.isArray(inner)) return inner.map(filled);
    if (typeof inner !== 'object' || inner === null) return inner;
    return Object.fromEntries(Object.entries(inner).map(([key, one]) => [key, filled(one)]));
  };
  return filled(value) as Value;
}
