import type { ManifestData } from '../../src/manifest/data.generated.ts';
import type { Manifest } from '../../src/manifest/manifest.ts';
import { readManifest } from '../../src/manifest/read.ts';
import { buildRecords } from '../../src/records/build.ts';
import { makeSeals, type SealRequest } from '../../src/records/make-seals.ts';
import type { Records } from '../../src/records/record.ts';
import { schemes as known, type Schemes } from '../../src/records/schemes.ts';
import type { Seal, SealsFile } from '../../src/records/seal.ts';
import { judgeStandings } from '../../src/records/standing.ts';
import { type FilesInMemory, snapshotFromMemory } from '../../src/repository/memory.ts';

/** The records of a manifest's text among files in memory; throws the manifest's problems. */
export async function recordsOf(
  text: string,
  files: FilesInMemory,
  { path = 'stoplog.yaml', schemes = known }: { path?: string; schemes?: Schemes } = {},
): Promise<Records> {
  const { manifest, problems } = readManifest(path, text);
  if (manifest === null) throw new Error(JSON.stringify(problems, null, 2));
  return buildRecords(manifest, snapshotFromMemory({ [path]: text, ...files }), schemes);
}

/** The same for a manifest given as data: quicker, for tests with many manifests. */
export function recordsFromData(
  data: ManifestData,
  files: FilesInMemory,
  schemes: Schemes = known,
): Promise<Records> {
  const nowhere = { position: () => ({ line: 1, column: 1 }), source: () => null };
  const manifest: Manifest = { path: 'stoplog.yaml', folder: '', text: '', data, ...nowhere };
  return buildRecords(manifest, snapshotFromMemory(files), schemes);
}

export function sealsFileOf(seals: ReadonlyMap<string, Seal>): SealsFile {
  return { path: 'stoplog.seals.json', exists: true, seals, unreadable: new Map(), faults: [] };
}

/** Plans to seal records over earlier seals, by an invented person. */
export function sealing(
  records: Records,
  seals: ReadonlyMap<string, Seal> = new Map(),
  request: Partial<SealRequest> = {},
  schemes: Schemes = known,
) {
  const sealsFile = sealsFileOf(seals);
  return makeSeals(
    {
      records,
      sealsFile,
      standings: judgeStandings(records, sealsFile, schemes),
      wanted: 'all',
      because: null,
      person: 'Ada Weir <ada@northmere.example>',
      today: '2026-03-02',
      evidence: new Map(),
      ...request,
    },
    schemes,
  );
}
