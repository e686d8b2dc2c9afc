import type { FileIdentity } from '../repository/snapshot.ts';
import type { Links } from './link.ts';
import { outcomeOf } from './outcome.ts';
import { fromFolder } from './paths.ts';
import type { RecordNode, Records } from './record.ts';
import type { Seal, SealedFile } from './seal.ts';

/** What a seal keeps of a record's content: all but who looked at it, when, and how far it was proven. */
export type SealedContent = Pick<
  Seal,
  'scheme' | 'substance' | 'wording' | 'accepts' | 'files' | 'rests_on' | 'digest' | 'outcome' | 'driven_by'
>;

/** The content of a record now, as a seal keeps it; `links` is by the scheme of the seal. */
export function sealedContent(record: RecordNode, links: Links, records: Records): SealedContent {
  const { folder } = records.manifest;
  const { substance, wording, accepts, claims } = record;
  const { scheme } = links;
  const below = links.restsOn.get(record.id) ?? [];
  const rests_on = Object.fromEntries(below.map((id) => [id, links.digests.get(id) ?? '']));
  const files = [...claims.values()].map(
    ({ path, identity }) => [fromFolder(folder, path), sealedFile(identity)] as const,
  );
  return {
    scheme,
    substance,
    wording,
    accepts,
    files: Object.fromEntries(files),
    rests_on,
    digest: links.digests.get(record.id) ?? '',
    ...outcomeOf(record, records, links),
  };
}

function sealedFile(identity: FileIdentity): SealedFile {
  return identity.kind === 'unavailable'
    ? { sha256: null, bytes: null, blob: identity.blob }
    : { sha256: identity.sha256, bytes: identity.bytes, blob: identity.blob };
}
