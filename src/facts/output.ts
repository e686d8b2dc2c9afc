import { defined, isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import { resolvePattern } from '../records/find-paths.ts';
import type { Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { SeriesLayout } from '../series/layout.ts';
import { columnOf, type Series } from '../series/series.ts';
import { contentAway, isContentHere, type Unusable } from './input.ts';
import { layoutOf, seriesOfFile } from './series-of.ts';
import { withStep } from './step-found.ts';

/** A file of a run, as a fragment of the manifest names it and says how it is laid out. */
export interface Output extends SeriesLayout {
  /** From the manifest's folder. */
  readonly file?: string | undefined;
}

/** An output, found in the snapshot. */
export interface OutputFile {
  /** From the top of the repository. */
  readonly path: string;
  readonly blob: string;
  readonly layout: SeriesLayout;
}

/** Where an output lies and what it is. */
export async function findOutput(
  output: Output,
  { manifest }: Pick<Records, 'manifest'>,
  snapshot: Snapshot,
): Promise<{ readonly value: OutputFile } | Unusable> {
  if (output.file === undefined) return { undefined: 'no file is named', away: null };
  const place = resolvePattern(manifest.folder, output.file);
  if (place === null) return { undefined: `${output.file} lies outside the repository`, away: null };
  const path = place.root + place.rest;
  const identity = (await snapshot.identify([path])).get(path);
  const blob = identity === undefined || !isContentHere(identity) ? null : identity.blob;
  if (blob === null) return contentAway(path, identity);
  return defined({ path, blob, layout: layoutOf(output) });
}

/**
 * The columns of an output, by name; in the step that is stated, or else the one that the times have. Undefined where any row
 * can't be read: what is left out silently would pass for missing.
 */
export async function readOutput(
  { path, layout }: OutputFile,
  snapshot: Snapshot,
): Promise<Statistic<ReadonlyMap<string, Series>>> {
  const table = await seriesOfFile(path, layout, snapshot);
  if (table === null) return undefinedBecause(`the content of ${path} is not here`);
  const { first, total } = table.problems;
  const [problem] = first;
  if (problem !== undefined) {
    const { line, expected, found, advice } = problem;
    const where = line === null ? path : `${path} line ${line}`;
    const more = total > 1 ? `, and ${total - 1} more such` : '';
    return undefinedBecause(
      `${where}: expected ${expected}, found ${found}${more}${advice && ` (${advice})`}`,
    );
  }
  return defined(
    new Map(
      table.columns.map(({ name }, place) => {
        const series = columnOf(table, place + 1);
        return [name, layout.step === undefined ? withStep(series) : series];
      }),
    ),
  );
}

/** The one series of an output; undefined where it names several columns. */
export async function readOutputSeries(file: OutputFile, snapshot: Snapshot): Promise<Statistic<Series>> {
  const columns = await readOutput(file, snapshot);
  if (!isDefined(columns)) return columns;
  const [series, ...more] = columns.value.values();
  if (series === undefined) return undefinedBecause(`${file.path} holds no series`);
  return more.length > 0
    ? undefinedBecause(`several columns of ${file.path} are named, where one is compared`)
    : defined(series);
}
