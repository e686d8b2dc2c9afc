import { type PrintedNumber, printedNumber } from '../../hydrology/stated/printed-number.ts';
import type { Scores } from '../../manifest/data.generated.ts';
import type { FieldPath, Manifest } from '../../manifest/manifest.ts';
import type { RecordNode } from '../../records/record.ts';
import type { Snapshot } from '../../repository/snapshot.ts';
import { findOutput } from '../output.ts';
import { readTable, type TableRow } from '../table-rows.ts';

export const scoredWindows = ['calibration', 'validation'] as const;
export type ScoredWindow = (typeof scoredWindows)[number];
export type StatedName = keyof Scores;

/** A score as a record, or its table, states it. */
export interface StatedScore {
  readonly window: ScoredWindow;
  readonly score: StatedName;
  /** With the decimals that are written. */
  readonly printed: PrintedNumber;
  /** In the manifest: the score, or the table that holds it. */
  readonly field: FieldPath;
  /** Where it stands in a table: path from the top of the repository, line from 1. */
  readonly at: { readonly file: string; readonly line: number } | null;
}

/** A row of a score table that is none. */
export interface UnreadRow {
  readonly file: string;
  readonly line: number;
  readonly expected: string;
  readonly found: string;
}

/** The scores in the record itself, by window. */
export function scoresInManifest(
  { field, fragment }: RecordNode<'evaluation'>,
  manifest: Manifest,
): readonly StatedScore[] {
  return scoredWindows.flatMap((window) =>
    Object.entries(fragment.scores?.[window] ?? {}).flatMap(([score, value]) => {
      const place = [...field, 'scores', window, score];
      const printed = printedNumber(manifest.source(place) ?? String(value));
      return printed === null
        ? []
        : [{ window, score: score as StatedName, printed, field: place, at: null }];
    }),
  );
}

export interface TableOfScores {
  readonly stated: readonly StatedScore[];
  readonly unread: readonly UnreadRow[];
}

/** The scores in the record's table; none where it names none. A table that can't be read is one unread row at line 1. */
export async function scoresInTable(
  target: RecordNode<'evaluation'>,
  names: ReadonlySet<string>,
  manifest: Manifest,
  snapshot: Snapshot,
): Promise<TableOfScores> {
  const table = target.fragment.scores?.table;
  if (table === undefined) return { stated: [], unread: [] };
  const layout = typeof table === 'string' ? { file: table } : table;
  const found = await findOutput(layout, { manifest }, snapshot);
  // A file that is not there has its own finding.
  if ('undefined' in found) return { stated: [], unread: [] };
  const { path: file } = found.value;
  const read = await readTable(file, layout, snapshot);
  if (typeof read === 'string')
    return { stated: [], unread: [{ file, line: 1, expected: 'a table', found: read }] };
  const stated: StatedScore[] = [];
  const unread: UnreadRow[] = [];
  for (const row of read) {
    if (!isAbout(target, row)) continue;
    for (const score of scoresIn(row, names))
      if ('expected' in score) unread.push({ ...score, file, line: row.line });
      else
        stated.push({ ...score, field: [...target.field, 'scores', 'table'], at: { file, line: row.line } });
  }
  return { stated, unread };
}

/** Whether a row is about a target: all are where the table has no column `target` (or `each`), which names the target or its entry. */
function isAbout({ name }: RecordNode<'evaluation'>, { cell }: TableRow): boolean {
  const named = cell('target') ?? cell('each');
  return named === undefined || named === name || (name ?? '').endsWith(`.${named}`);
}

type InRow = Pick<StatedScore, 'window' | 'score' | 'printed'>;

/** The one score of a row, or with a column for each score, those that are there. */
function scoresIn(
  { cell }: TableRow,
  names: ReadonlySet<string>,
): readonly (InRow | Pick<UnreadRow, 'expected' | 'found'>)[] {
  const window = scoredWindows.find((one) => one === cell('window'));
  if (window === undefined)
    return [
      { expected: 'a window, calibration or validation', found: cell('window') ?? 'no column `window`' },
    ];
  const score = cell('score');
  const inColumns = [...names].filter((name) => (cell(name) ?? '') !== '');
  const pairs: readonly (readonly [string, string | undefined])[] =
    score === undefined && inColumns.length > 0
      ? inColumns.map((name) => [name, cell(name)])
      : [[score ?? '', cell('value')]];
  return pairs.map(([name, value]) => {
    if (!names.has(name))
      return { expected: `a score (${[...names].join(', ')})`, found: score ?? 'no column `score`' };
    const printed = printedNumber(value ?? '');
    if (printed === null) return { expected: 'a number', found: value ?? 'no column `value`' };
    return { window, score: name as StatedName, printed };
  });
}
