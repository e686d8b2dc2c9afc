import { createHash, type Hash } from 'node:crypto';
import { Failure } from '../../failure.ts';
import type { DossierContent, DossierFile } from '../content.ts';
import { payloadPath } from '../layout.ts';
import { fileOfBytes, type PackedFile } from '../package/packed-file.ts';
import type { Payload, PayloadFile } from '../payload.ts';
import { manifestText } from './manifest-lines.ts';
import { bagInfo, declaration, fetchText } from './tag-files.ts';

/**
 * A BagIt 1.0 bag (RFC 8493), file by file in code-unit order of path. Payload comes from the revision's blobs. There is always a
 * SHA-256 manifest; a SHA-512 one only where every payload byte is read here, since of a file that is to be fetched no more than
 * its stated SHA-256 is known.
 */
export async function* bagFiles(
  content: DossierContent,
  payload: Payload,
  documents: readonly DossierFile[],
): AsyncGenerator<PackedFile> {
  const inData = [
    ...documents.map((document) => fileOfBytes(`data/${document.path}`, document.content)),
    ...payload.files.map((file) => fileOfPayload(file, content)),
  ].sort((a, b) => (a.path < b.path ? -1 : 1));
  const sizes = [...inData, ...payload.fetched].map(({ bytes }) => bytes);
  const before = new Map([
    ['bag-info.txt', bagInfo(content, sizes)],
    ['bagit.txt', declaration],
  ]);
  for (const [path, text] of before) yield fileOfBytes(path, text);

  const sha256 = new Map(payload.fetched.map((file) => [`data/${payloadPath(file.path)}`, file.sha256]));
  const sha512 = new Map<string, string>();
  for (const file of inData) {
    const hashes = { sha256: createHash('sha256'), sha512: createHash('sha512') };
    yield hashed(file, [hashes.sha256, hashes.sha512]);
    sha256.set(file.path, hashes.sha256.digest('hex'));
    sha512.set(file.path, hashes.sha512.digest('hex'));
  }
  checkDigests(payload.files, sha256);

  const all = payload.fetched.length === 0;
  const after = new Map([
    ...(all ? [] : ([['fetch.txt', fetchText(payload.fetched)]] as const)),
    ['manifest-sha256.txt', manifestText(sha256)],
    ...(all ? ([['manifest-sha512.txt', manifestText(sha512)]] as const) : []),
  ]);
  for (const [path, text] of after) yield fileOfBytes(path, text);
  for (const algorithm of all ? ['sha256', 'sha512'] : ['sha256']) {
    const digests = [...before, ...after].map(
      ([path, text]) => [path, createHash(algorithm).update(text).digest('hex')] as const,
    );
    yield fileOfBytes(`tagmanifest-${algorithm}.txt`, manifestText(new Map(digests)));
  }
}

function fileOfPayload({ path, bytes, executable }: PayloadFile, { snapshot }: DossierContent): PackedFile {
  return { path: `data/${payloadPath(path)}`, bytes, executable, chunks: () => snapshot.stream(path) };
}

function hashed(file: PackedFile, hashes: readonly Hash[]): PackedFile {
  return {
    ...file,
    async *chunks() {
      for await (const chunk of file.chunks()) {
        for (const hash of hashes) hash.update(chunk);
        yield chunk;
      }
    },
  };
}

/** What was packed must be what the records' digests are of. */
function checkDigests(files: readonly PayloadFile[], packed: ReadonlyMap<string, string>): void {
  const other = files.find(({ path, sha256 }) => packed.get(`data/${payloadPath(path)}`) !== sha256);
  if (other === undefined) return;
  throw new Failure(
    'unreadable-file',
    `${JSON.stringify(other.path)} gave other bytes than those of its SHA-256 ${other.sha256}.`,
    'Nothing was written. See `git fsck` and, for a Git LFS file, `git lfs fsck`; then try again.',
  );
}
