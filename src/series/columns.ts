import type { ColumnReference } from './layout.ts';
import type { SeriesProblem } from './table.ts';

/** Where the columns of a layout stand in the rows of one file. */
export interface Columns {
  /** Places from 0, in the order asked for. */
  readonly places: readonly number[];
  /** As the header has them; `column 3` without a header. */
  readonly names: readonly string[];
}

/** Finds columns by name or place; a problem says which one the header does not have, or has twice. `names` is null without a header. */
export function findColumns(
  wanted: readonly ColumnReference[],
  header: { readonly names: readonly string[]; readonly line: number } | null,
): Columns | SeriesProblem {
  const places: number[] = [];
  for (const reference of wanted) {
    const place = placeOf(reference, header?.names ?? null);
    if (typeof place === 'number') places.push(place);
    else return { line: header?.line ?? null, column: String(reference), ...place };
  }
  return { places, names: places.map((place) => header?.names[place] ?? `column ${place + 1}`) };
}

type Fault = Pick<SeriesProblem, 'expected' | 'found' | 'advice'>;

function placeOf(reference: ColumnReference, names: readonly string[] | null): number | Fault {
  if (typeof reference === 'number') {
    if (reference >= 1 && (names === null || reference <= names.length)) return reference - 1;
    return {
      expected: `a column ${reference}, counted from 1`,
      found: names === null ? 'no such place' : `${names.length} columns in the header`,
      advice: '',
    };
  }
  if (names === null)
    return {
      expected: `a header with a column named "${reference}"`,
      found: 'a layout that says the file has none (header: false)',
      advice: 'give the place of the column, counted from 1, or say header: true',
    };
  const place = names.indexOf(reference.trim());
  if (place < 0)
    return {
      expected: `a column named "${reference}"`,
      found: names.length === 1 ? `one column, "${names[0]}"` : `the columns ${names.join(', ')}`,
      advice:
        names.length === 1
          ? 'check separator (comma, semicolon, tab, blank) and skip_lines'
          : 'check the name, and skip_lines if the header stands elsewhere',
    };
  if (names.indexOf(reference.trim(), place + 1) >= 0)
    return {
      expected: `one column named "${reference}"`,
      found: 'several of that name',
      advice: 'give the place of the column, counted from 1',
    };
  return place;
}
