import { layoutOf, seriesFilesOf, seriesOfFile } from '../../../facts/series-of.ts';
import { fromFolder } from '../../../records/paths.ts';
import type { RecordNode, Records } from '../../../records/record.ts';
import type { Snapshot } from '../../../repository/snapshot.ts';
import { secondsOfDay } from '../../../series/calendar.ts';
import { gapsOf } from '../../../series/gaps.ts';
import { columnOf, type Series } from '../../../series/series.ts';
import { afterSteps } from '../../../series/step.ts';
import type { BarRow, Stretch } from '../../charts/bars-over-time.ts';

/** Rows of one input's picture; more files than that make it no clearer. */
const mostRows = 24;

export interface GapRows {
  readonly rows: readonly BarRow[];
  /** Missing steps in these rows. */
  readonly missing: number;
  /** Columns that are left out. */
  readonly more: number;
}

/** For each column of an input's files: from first to last value, and the gaps between; one file in hand at a time. */
export async function gapRows(
  input: RecordNode<'inputs'>,
  records: Records,
  snapshot: Snapshot,
): Promise<GapRows> {
  const layout = layoutOf(input.fragment.series ?? {});
  const rows: BarRow[] = [];
  let [missing, more] = [0, 0];
  for (const { path } of seriesFilesOf(input)) {
    if (rows.length >= mostRows) {
      more++;
      continue;
    }
    const table = await seriesOfFile(path, layout, snapshot);
    for (const [place, { name }] of (table?.columns ?? []).entries()) {
      if (table === null || rows.length >= mostRows) {
        more++;
        continue;
      }
      const series = columnOf(table, place + 1);
      const gaps = gapsOf(series);
      missing += gaps.reduce((sum, { steps }) => sum + steps, 0);
      rows.push({
        name: `${fromFolder(records.manifest.folder, path)} ${name}`,
        mark: 'bar',
        ...drawnAs(series, gaps),
      });
    }
  }
  return { rows, missing, more };
}

function drawnAs(
  series: Series,
  gaps: ReturnType<typeof gapsOf>,
): { readonly stretches: readonly Stretch[]; readonly gaps: readonly Stretch[] } {
  const stretch = (first: number, last: number): Stretch => ({
    from: first / secondsOfDay,
    to: Math.max(afterSteps(last, 1, series.step), last) / secondsOfDay,
  });
  const [first, last] = [series.timeSeconds[0], series.timeSeconds.at(-1)];
  return {
    stretches: first === undefined || last === undefined ? [] : [stretch(first, last)],
    gaps: gaps.map(({ firstSeconds, lastSeconds }) => stretch(firstSeconds, lastSeconds)),
  };
}
