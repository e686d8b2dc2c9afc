import { defined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import type { Combine, InputReference } from '../manifest/data.generated.ts';
import { fromFolder } from '../records/paths.ts';
import type { Claim, RecordNode, Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { combine } from '../series/combine.ts';
import type { SeriesLayout } from '../series/layout.ts';
import { readSeries } from '../series/read.ts';
import { columnOf, joinSeries, type Series } from '../series/series.ts';
import type { SeriesTable } from '../series/table.ts';

type InputRecord = RecordNode<'inputs'>;

/** Values that tables in hand hold together; above it those not asked for longest are read again if need be. */
const mostValues = 16_000_000;

interface Held {
  readonly table: Promise<SeriesTable | null>;
  /** 0 until read. */
  values: number;
}

const tablesOf = new WeakMap<Snapshot, Map<string, Held>>();

/**
 * A file of a time series (path from the top of the repository), read as the layout says; once for all who ask within a
 * run. Null where its content is not here.
 */
export function seriesOfFile(
  path: string,
  layout: SeriesLayout,
  snapshot: Snapshot,
): Promise<SeriesTable | null> {
  const tables = tablesOf.get(snapshot) ?? new Map<string, Held>();
  tablesOf.set(snapshot, tables);
  const key = JSON.stringify([path, layoutOf(layout)]);
  const held = tables.get(key) ?? { table: read(path, layout, snapshot), values: 0 };
  tables.delete(key);
  tables.set(key, held);
  return held.table.then((table) => {
    held.values = table === null ? 0 : table.timeSeconds.length * (table.columns.length + 2);
    letGo(tables);
    return table;
  });
}

async function read(path: string, layout: SeriesLayout, snapshot: Snapshot): Promise<SeriesTable | null> {
  const identity = (await snapshot.identify([path])).get(path);
  const isHere = identity?.kind === 'file' || (identity?.kind === 'pointer' && identity.present);
  return isHere ? readSeries(snapshot.stream(path), layout, path) : null;
}

function letGo(tables: Map<string, Held>): void {
  let sum = 0;
  for (const { values } of tables.values()) sum += values;
  for (const [key, { values }] of tables) {
    if (sum <= mostValues) return;
    if (values === 0) continue;
    tables.delete(key);
    sum -= values;
  }
}

const layoutKeys = [
  ...(['time', 'values', 'separator', 'widths', 'decimal', 'skip_lines'] as const),
  ...(['header', 'comment', 'missing', 'unit', 'step', 'utc_offset'] as const),
] satisfies readonly (keyof SeriesLayout)[];

/** What of a manifest's fragment says how a file is read; for keys of what was computed from it. */
export function layoutOf(fragment: SeriesLayout): SeriesLayout {
  return Object.fromEntries(layoutKeys.map((key) => [key, fragment[key]]));
}

/** The data files of an input, in order of path. */
export function seriesFilesOf({ claims, field }: InputRecord): readonly Claim[] {
  return [...claims.values()].filter((claim) => claim.own && claim.field[field.length] === 'files');
}

/**
 * The one series that an input stands for: its files, columns and entries of `each` together, as its `combine` says; or
 * the one file and columns that the reference names. In the unit and step that the input states.
 * Undefined: no such input or file, content that is not here or does not read as a series, several series and nothing that
 * says what they make together.
 */
export async function seriesOfInput(
  reference: InputReference,
  records: Records,
  snapshot: Snapshot,
): Promise<Statistic<Series>> {
  const { input, file, values } = reference;
  const parts: Part[] = [];
  const holders = inputsNamed(input, records);
  for (const holder of holders) {
    const layout = { ...holder.fragment.series, ...(values === undefined ? {} : { values }) };
    for (const { path } of seriesFilesOf(holder)) {
      const name = fromFolder(records.manifest.folder, path);
      if (file !== undefined && name !== file) continue;
      const table = await seriesOfFile(path, layout, snapshot);
      if (table === null) return undefinedBecause(`the content of ${path} is not here`);
      if (table.columns.length === 0)
        return undefinedBecause(
          holder.fragment.series === undefined
            ? `${holder.id} does not say under \`series\` how ${path} is to be read`
            : `${path} can't be read as a series`,
        );
      for (const [place, column] of table.columns.entries())
        parts.push({ entry: holder.id, file: name, column: column.name, series: columnOf(table, place + 1) });
    }
  }
  if (parts.length === 0)
    return undefinedBecause(
      `inputs.${input} has no ${file === undefined ? 'file' : `file ${file}`} of a series`,
    );
  return together(parts, holders[0]?.fragment.combine, `inputs.${input}`);
}

/** The input of that name, or all that `each` makes of it. */
export function inputsNamed(input: string, { nodes }: Records): readonly InputRecord[] {
  const named = [...nodes.values()].filter(
    ({ id, area }) => area === 'inputs' && (id === `inputs.${input}` || id.startsWith(`inputs.${input}.`)),
  );
  return named as unknown as readonly InputRecord[];
}

/** One column of one file. */
interface Part {
  /** The id of its record, which differs between the entries of an `each`. */
  readonly entry: string;
  /** From the manifest's folder. */
  readonly file: string;
  readonly column: string;
  readonly series: Series;
}

/** Files of one entry follow one another in time, unless `how` says what files make together. */
function together(parts: readonly Part[], how: Combine | undefined, input: string): Statistic<Series> {
  const varies = (key: 'entry' | 'file' | 'column') => new Set(parts.map((part) => part[key])).size > 1;
  const byEntry = varies('entry');
  const byFile = !byEntry && how !== undefined && varies('file');
  const byColumn = varies('column');
  const groups = new Map<string, [Series, ...Series[]]>();
  for (const { entry, file, column, series } of parts) {
    const name = [
      ...(byEntry ? [entry.slice(input.length + 1)] : byFile ? [file] : []),
      ...(byColumn ? [column] : []),
    ].join(' ');
    const group = groups.get(name);
    if (group === undefined) groups.set(name, [series]);
    else group.push(series);
  }
  const named = new Map([...groups].map(([name, group]) => [name, joinSeries(group)]));
  const [only] = named.values();
  if (only !== undefined && named.size === 1) return defined(only);
  if (how !== undefined && how !== 'each') return combine(named, how);
  return undefinedBecause(
    `${input} holds ${named.size} series, and \`combine\` does not say what they make together`,
  );
}
