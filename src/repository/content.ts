import { createHash, hash } from 'node:crypto';
import { Failure } from '../failure.ts';
import { type Blobs, blobOf, type FoundBlob } from './blobs.ts';
import type { BlobDigest } from './digest-memory.ts';
import type { FindLarge } from './large-files.ts';
import type { Listing } from './listing.ts';
import { type Located, locator } from './locate.ts';
import type { Memories } from './memories.ts';
import { blobsOfOthers } from './part.ts';
import { parsePointer, pointerBytesBelow } from './pointer.ts';
import type { FileIdentity, Snapshot, Unavailable } from './snapshot.ts';

type Content = Pick<Snapshot, 'identify' | 'read' | 'stream' | 'readBlob'>;
/** What `read` takes into memory unless told otherwise; series are streamed. */
const defaultLimitBytes = 256 * 1024 * 1024;

/** Up to here one call on the whole is faster than a hash fed in chunks. */
const hashedWholeBytes = 256 * 1024;

/** In place of a digest that another part works out; nothing that comes of it is ever shown. */
const ofAnotherPart = 'of another part';

/** Answers a snapshot's questions about content, from its listing and the places where content is kept. */
export function contentOf(
  listing: Listing,
  blobs: Blobs,
  findLarge: FindLarge,
  { digests, part, left }: Pick<Memories, 'digests' | 'part' | 'left'>,
  /** Told how far it has come. */
  progress: (text: string) => void = () => {},
): Content {
  const locate = locator(listing, blobs);

  async function digestAll(located: Iterable<Located>): Promise<void> {
    const asked = new Set<string>();
    for (const found of located) if ('mode' in found) asked.add(found.blob);
    const unknown = new Set([...asked].filter((blob) => !left.has(blob) && digests.get(blob) === undefined));
    if (unknown.size === 0) return;
    if (part !== undefined) {
      // By all that is asked about: how the work is shared must not depend on what one of the runs knows.
      for (const [blob, bytes] of await blobsOfOthers([...asked], part, blobs))
        if (unknown.delete(blob)) left.set(blob, bytes);
    }
    let read = 0;
    await blobs.visit([...unknown], async (id, blob) => {
      progress(`reading files: ${read++} of ${unknown.size}`);
      if (blob !== null) digests.set(id, await digestOf(blob));
    });
  }

  function identityOf(found: Located): FileIdentity | Promise<FileIdentity> {
    if (!('mode' in found)) return { kind: 'unavailable', ...found };
    const { blob } = found;
    const bytesLeft = left.get(blob);
    if (bytesLeft !== undefined) return { kind: 'file', sha256: ofAnotherPart, bytes: bytesLeft, blob };
    const known = digests.get(blob);
    if (known === undefined) return { kind: 'unavailable', why: 'not-fetched', blob };
    const { kind, sha256, bytes } = known;
    if (kind === 'content') return { kind: 'file', sha256, bytes, blob };
    const extended = kind === 'extended-pointer';
    return findLarge({ sha256, bytes, extended }).then((large) => {
      return { kind: 'pointer', sha256, bytes, blob, present: large !== null };
    });
  }

  /** What a blob stands for: its own content, or that of the Git LFS pointer that it is; null where that is not here. */
  async function open(id: string): Promise<FoundBlob | null> {
    const blob = await blobs.open(id);
    if (blob === null || blob.bytes >= pointerBytesBelow) return blob;
    const content = await blob.whole();
    const pointer = parsePointer(content);
    return pointer === null ? blobOf(content) : findLarge(pointer);
  }

  async function openPath(path: string): Promise<FoundBlob | Unavailable> {
    const found = (await locate([path])).get(path);
    if (found === undefined) return 'absent';
    return 'mode' in found ? ((await open(found.blob)) ?? 'not-fetched') : found.why;
  }

  return {
    async identify(paths) {
      const located = await locate([...paths]);
      await digestAll(located.values());
      const identities = new Map<string, FileIdentity>();
      for (const [path, found] of located) identities.set(path, await identityOf(found));
      return identities;
    },
    async read(path, limit) {
      const blob = await openPath(path);
      return typeof blob === 'string' ? null : wholeWithin(blob, path, limit);
    },
    async *stream(path) {
      const blob = await openPath(path);
      if (typeof blob !== 'string') return yield* blob.chunks();
      throw new Failure(
        'unreadable-file',
        `The content of ${path} is not here (${blob}).`,
        'Fetch it, or mend the link that should lead to it.',
      );
    },
    async readBlob(id, limit) {
      const blob = await open(id);
      return blob && wholeWithin(blob, `object ${id}`, limit);
    },
  };
}

/** Hashes a blob, a large one as it comes; a Git LFS pointer stands for what it names. */
async function digestOf(blob: FoundBlob): Promise<BlobDigest> {
  const { bytes } = blob;
  if (bytes > hashedWholeBytes) {
    const hashed = createHash('sha256');
    for await (const chunk of blob.chunks()) hashed.update(chunk);
    return { sha256: hashed.digest('hex'), bytes, kind: 'content' };
  }
  const content = await blob.whole();
  const pointer = parsePointer(content);
  if (pointer === null) return { sha256: hash('sha256', content, 'hex'), bytes, kind: 'content' };
  return {
    sha256: pointer.sha256,
    bytes: pointer.bytes,
    kind: pointer.extended ? 'extended-pointer' : 'pointer',
  };
}

function wholeWithin(blob: FoundBlob, name: string, limit = defaultLimitBytes): Promise<Uint8Array> {
  if (blob.bytes <= limit) return blob.whole();
  throw new Failure(
    'unreadable-file',
    `${name} has ${blob.bytes} bytes, more than the ${limit} bytes that are read at once.`,
    'See that it is the file you mean; split it if it really is so large.',
  );
}
