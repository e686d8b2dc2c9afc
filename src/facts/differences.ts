import { fromFolder } from '../records/paths.ts';
import type { FragmentOf, RecordNode, Records } from '../records/record.ts';
import type { Standing } from '../records/seal.ts';
import type { FileIdentity, Snapshot } from '../repository/snapshot.ts';
import { differenceOfSeries, type SeriesDifference } from '../series/difference.ts';
import type { SeriesLayout } from '../series/layout.ts';
import { readSeries } from '../series/read.ts';

/**
 * What changed, in the data's own terms, in each file that made its record stale and that reads as a series both as it was
 * sealed and as it is now. Files whose old content is gone from the repository are left out.
 */
export async function differencesOf(
  records: Records,
  standings: ReadonlyMap<string, Standing>,
  snapshot: Snapshot,
): Promise<ReadonlyMap<string, SeriesDifference>> {
  const found = new Map<string, SeriesDifference>();
  for (const { record: id, changes } of standings.values()) {
    const record = records.nodes.get(id);
    for (const change of changes) {
      if (record === undefined || change.kind !== 'file' || change.now === null) continue;
      const layout = layoutOf(record, change.path, records);
      const { blob, bytes } = change.was ?? {};
      if (!layout || !blob || (bytes ?? 0) > largestBytes || !isHere(change.now)) continue;
      const before = await snapshot.readBlob(blob);
      if (before === null) continue;
      const was = await readSeries([before], layout, change.path);
      const now = await readSeries(snapshot.stream(change.path), layout, change.path);
      if (was.columns.length > 0 && now.columns.length > 0)
        found.set(change.path, differenceOfSeries(was, now));
    }
  }
  return found;
}

/** A larger file is not compared value by value: its old content would have to be held in memory. */
const largestBytes = 128 * 2 ** 20;

function isHere(identity: FileIdentity): boolean {
  return identity.kind === 'file' || (identity.kind === 'pointer' && identity.present);
}

/** How a record, or the evaluation of a run, says that the file is laid out; undefined where none does. */
function layoutOf(record: RecordNode, path: string, { nodes, manifest }: Records): SeriesLayout | undefined {
  if (record.area === 'inputs') {
    const isData = record.claims.get(path)?.field[record.field.length] === 'files';
    return isData ? (record.fragment as FragmentOf['inputs']).series : undefined;
  }
  if (record.area !== 'runs') return undefined;
  const file = fromFolder(manifest.folder, path);
  return [...nodes.values()]
    .flatMap((node) =>
      node.area === 'evaluation' ? (node.fragment as FragmentOf['evaluation']).simulated : [],
    )
    .find((simulated) => simulated?.file === file);
}
