import { createHash } from 'node:crypto';
import { Failure } from '../failure.ts';
import { type Blobs, blobOf, type FoundBlob, wholeOf } from './blobs.ts';
import type { BlobDigest, DigestMemory } from './digest-memory.ts';
import type { FindLarge } from './large-files.ts';
import { followLinks } from './links.ts';
import type { Listing } from './listing.ts';
import { nameFromBytes } from './names.ts';
import { parsePointer, pointerBytesBelow } from './pointer.ts';
import type { Entry, FileIdentity, Snapshot, Unavailable } from './snapshot.ts';

type Content = Pick<Snapshot, 'identify' | 'read' | 'stream' | 'readBlob'>;
type Located = Entry | { readonly why: Unavailable; readonly blob: string | null };

const whyOf = {
  outside: 'link-outside',
  'too-many': 'link-dangling',
  'unknown-target': 'not-fetched',
} as const;

/** What `read` takes into memory unless told otherwise; series are streamed. */
const defaultLimitBytes = 256 * 1024 * 1024;

/** Answers a snapshot's questions about content, from its listing and the places where content is kept. */
export function contentOf(
  listing: Listing,
  blobs: Blobs,
  findLarge: FindLarge,
  memory: DigestMemory,
): Content {
  const unmerged = new Set(listing.unmerged);
  const intended = new Set(listing.intentToAdd);
  const crossings = [...listing.entries.values()].filter(
    ({ mode }) => mode === '120000' || mode === '160000',
  );
  let targets: Promise<ReadonlyMap<string, string>> | undefined;

  /** What all links of the snapshot say; asked for once, and only if a path could lead over one. */
  async function linkTargets(): Promise<ReadonlyMap<string, string>> {
    const found = new Map<string, string>();
    const ids = crossings.filter(({ mode }) => mode === '120000').map(({ blob }) => blob);
    await blobs.visit([...new Set(ids)], async (id, blob) => {
      if (blob !== null) found.set(id, nameFromBytes(Buffer.from(await wholeOf(blob))));
    });
    return found;
  }

  async function locate(path: string): Promise<Located> {
    const entry = listing.entries.get(path);
    if (entry?.mode.startsWith('100')) return entry;
    if (crossings.length === 0) return missing(path);
    targets ??= linkTargets();
    const led = followLinks(path, listing.entries, await targets);
    if (led.kind === 'submodule') return { why: 'submodule', blob: led.entry.blob };
    if (led.kind !== 'path') return { why: whyOf[led.kind], blob: led.link?.blob ?? null };
    const reached = listing.entries.get(led.path);
    if (reached !== undefined) return reached;
    const { why } = missing(led.path);
    return why === 'absent' && led.link !== null
      ? { why: 'link-dangling', blob: led.link.blob }
      : { why, blob: null };
  }

  function missing(path: string): { readonly why: Unavailable; readonly blob: null } {
    const why = unmerged.has(path) ? 'unmerged' : intended.has(path) ? 'intent-to-add' : 'absent';
    return { why, blob: null };
  }

  async function digestAll(ids: readonly string[]): Promise<void> {
    await blobs.visit(ids, async (id, blob) => {
      if (blob !== null) memory.set(id, await digestOf(blob));
    });
  }

  async function identityOf(blob: string): Promise<FileIdentity> {
    const known = memory.get(blob);
    if (known === undefined) return { kind: 'unavailable', why: 'not-fetched', blob };
    const { sha256, bytes, kind } = known;
    if (kind === 'content') return { kind: 'file', sha256, bytes, blob };
    const large = await findLarge({ sha256, bytes, extended: kind === 'extended-pointer' });
    return { kind: 'pointer', sha256, bytes, blob, present: large !== null };
  }

  /** What a blob stands for: its own content, or that of the Git LFS pointer that it is; null where that is not here. */
  async function open(id: string): Promise<FoundBlob | null> {
    const blob = await blobs.open(id);
    if (blob === null || blob.bytes >= pointerBytesBelow) return blob;
    const content = await wholeOf(blob);
    const pointer = parsePointer(content);
    return pointer === null ? blobOf(content) : findLarge(pointer);
  }

  return {
    async identify(paths) {
      const located = new Map<string, Located>();
      for (const path of paths) located.set(path, await locate(path));
      const wanted = [...located.values()].flatMap((found) => ('mode' in found ? [found.blob] : []));
      const unknown = new Set(wanted.filter((blob) => memory.get(blob) === undefined));
      await digestAll([...unknown]);
      const identities = new Map<string, FileIdentity>();
      for (const [path, found] of located) {
        identities.set(
          path,
          'mode' in found ? await identityOf(found.blob) : { kind: 'unavailable', ...found },
        );
      }
      return identities;
    },
    async read(path, limit) {
      const found = await locate(path);
      const blob = 'mode' in found ? await open(found.blob) : null;
      return blob && wholeWithin(blob, limit, path);
    },
    async *stream(path) {
      const found = await locate(path);
      const blob = 'mode' in found ? await open(found.blob) : null;
      if (blob !== null) return yield* blob.chunks();
      throw new Failure(
        'unreadable-file',
        `The content of ${path} is not here (${'mode' in found ? 'not-fetched' : found.why}).`,
        'Fetch it, or mend the link that should lead to it.',
      );
    },
    async readBlob(id, limit) {
      const blob = await open(id);
      return blob && wholeWithin(blob, limit, `object ${id}`);
    },
  };
}

/** Hashes a blob as it comes; a Git LFS pointer stands for what it names. */
async function digestOf(blob: FoundBlob): Promise<BlobDigest> {
  if (blob.bytes < pointerBytesBelow) {
    const content = await wholeOf(blob);
    const pointer = parsePointer(content);
    if (pointer !== null) {
      const { sha256, bytes, extended } = pointer;
      return { sha256, bytes, kind: extended ? 'extended-pointer' : 'pointer' };
    }
    return { sha256: createHash('sha256').update(content).digest('hex'), bytes: blob.bytes, kind: 'content' };
  }
  const hash = createHash('sha256');
  for await (const chunk of blob.chunks()) hash.update(chunk);
  return { sha256: hash.digest('hex'), bytes: blob.bytes, kind: 'content' };
}

function wholeWithin(blob: FoundBlob, limit = defaultLimitBytes, name: string): Promise<Uint8Array> {
  if (blob.bytes <= limit) return wholeOf(blob);
  throw new Failure(
    'unreadable-file',
    `${name} has ${blob.bytes} bytes, more than the ${limit} bytes that are read at once.`,
    'See that it is the file you mean; split it if it really is so large.',
  );
}
