import { createHash } from 'node:crypto';
import type { DossierContent } from './content.ts';

/**
 * A UUID for the dossier as a whole: the first bits of a SHA-256 over the commit and the digests of its records (RFC 9562, version
 * 8), so that the same content has the same identifier wherever the dossier is made.
 */
export function dossierIdentifier({ commit, studies }: DossierContent): string {
  const records = studies.map(({ facts }) => [
    facts.manifest.path,
    ...[...facts.records.nodes.values()].map(({ id, digest }) => [id, digest]),
  ]);
  return uuidOf(JSON.stringify(['stoplog dossier 1', commit, records]));
}

export function uuidOf(text: string): string {
  const bytes = createHash('sha256').update(text).digest().subarray(0, 16);
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x80;
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80;
  const hex = bytes.toString('hex');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}
