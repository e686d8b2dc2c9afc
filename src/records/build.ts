import type { Manifest } from '../manifest/manifest.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { sha256OfJson } from './canonical.ts';
import { claimFiles } from './claims.ts';
import { coveredFiles } from './covered.ts';
import { pathFinder } from './find-paths.ts';
import { linkRecords, type Unlinked } from './link.ts';
import { seenFiles, unknownMentions } from './mentioned.ts';
import { filesNamedBy } from './named-files.ts';
import { nearestKnown } from './names.ts';
import { partsOf } from './parts.ts';
import type { RecordNode, Records, UnknownName } from './record.ts';
import { schemes as known, newest, type Schemes } from './schemes.ts';
import { isStoplogFile } from './seals-path.ts';
import { statementsOf } from './statements.ts';

/** All records of a manifest, met with the files of a snapshot and digested by the newest scheme. */
export async function buildRecords(
  manifest: Manifest,
  snapshot: Snapshot,
  schemes: Schemes = known,
): Promise<Records> {
  const { folder } = manifest;
  const paths = [...snapshot.entries.keys(), ...snapshot.unmerged, ...snapshot.intentToAdd].filter(
    (path) => !isStoplogFile(path),
  );
  const find = pathFinder(paths, folder);
  const stated = await statementsOf(manifest, async (pattern) => {
    const [path] = find(pattern)?.paths ?? [];
    const bytes = path === undefined ? null : await snapshot.read(path);
    return bytes === null ? null : new TextDecoder().decode(bytes);
  });

  const named = [
    ...[...stated.statements.values()].flatMap((statement) =>
      filesNamedBy(statement, stated).map((file) => ({ record: statement.id, file })),
    ),
    ...seenFiles(stated, stated.tables),
  ];
  const claimed = await claimFiles(named, find, folder, snapshot);
  const unlinked = new Map<string, Unlinked>();
  for (const [id, statement] of stated.statements) {
    const { substance, wording, accepts } = partsOf(statement, manifest);
    unlinked.set(id, {
      ...statement,
      present: true,
      claims: claimed.claims.get(id) ?? new Map(),
      elsewhere: claimed.elsewhere.get(id) ?? [],
      substance: sha256OfJson(substance),
      wording: sha256OfJson(wording),
      accepts: accepts.map(sha256OfJson),
    });
  }

  const linked = linkRecords(newest(schemes), manifest, unlinked);
  const nodes = new Map<string, RecordNode>();
  for (const id of linked.order) {
    const record = unlinked.get(id);
    if (record === undefined) continue;
    nodes.set(id, { ...record, restsOn: linked.restsOn.get(id) ?? [], digest: linked.digests.get(id) ?? '' });
  }
  const covered = coveredFiles(manifest, find, snapshot.entries.keys());
  return {
    manifest,
    scheme: linked.scheme,
    nodes,
    digests: linked.digests,
    circle: linked.circle,
    unmatched: [...claimed.unmatched, ...covered.unmatched],
    unknown: [...linked.unresolved, ...unknownMentions(stated)].map(({ record, reference }): UnknownName => {
      const { written: name, field } = reference;
      return { record, name, field, nearest: nearestKnown(reference, stated) };
    }),
    unaccounted: covered.paths.filter((path) => !claimed.paths.has(path)),
  };
}
