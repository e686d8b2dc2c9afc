import { join } from 'node:path';
import { keptText, linesOfKept, loadLines, saveLines } from './kept-lines.ts';
import type { MemoryFolders } from './memory-folders.ts';

/** What a blob turned out to be. For a Git LFS pointer: digest and size of the content it names. */
export interface BlobDigest {
  readonly sha256: string;
  readonly bytes: number;
  readonly kind: 'content' | 'pointer' | 'extended-pointer';
}

/** Digests by blob id, kept between runs so that an unchanged repository costs no hashing. */
export interface DigestMemory {
  get(blob: string): BlobDigest | undefined;
  set(blob: string, digest: BlobDigest): void;
  /** Keeps what is new. A folder that cannot be written is no fault: the memory is disposable. */
  save(): Promise<void>;
}

const firstLine = 'stoplog digests 1';
/** Above this the oldest entries go. */
const mostEntries = 200_000;

/** The memory of a repository: the file `digests` in each of the folders. */
export async function openDigestMemory(folders: MemoryFolders): Promise<DigestMemory> {
  const [file = '', ...others] = [folders.own, ...folders.others].map((folder) => join(folder, 'digests'));
  const load = async (from: string) => fromLines(await loadLines(from, firstLine));
  const known = await load(file);
  const elsewhere = await Promise.all(others.map(load));
  const fresh = new Map<string, BlobDigest>();
  const fetch = (blob: string) => {
    const digest = elsewhere.find((one) => one.has(blob))?.get(blob);
    if (digest !== undefined) fresh.set(blob, digest);
    return digest;
  };
  return {
    get: (blob) => fresh.get(blob) ?? known.get(blob) ?? fetch(blob),
    set: (blob, digest) => fresh.set(blob, digest),
    async save() {
      if (fresh.size === 0) return;
      // Another run may have saved meanwhile; what it found is as true as ours.
      const all = new Map([...(await load(file)), ...fresh]);
      await saveLines(file, firstLine, toLines(all));
      for (const [blob, digest] of fresh) known.set(blob, digest);
      fresh.clear();
    },
  };
}

/** A memory that forgets at the end of the run. */
export function forgetfulMemory(): DigestMemory {
  const digests = new Map<string, BlobDigest>();
  return {
    get: (blob) => digests.get(blob),
    set: (blob, digest) => digests.set(blob, digest),
    save: async () => {},
  };
}

/** One line each, oldest first. */
export function digestsToText(digests: ReadonlyMap<string, BlobDigest>): string {
  return keptText(firstLine, toLines(digests));
}

/** Empty for a file that is not exactly as `digestsToText` wrote it. */
export function digestsFromText(text: string): Map<string, BlobDigest> {
  return fromLines(linesOfKept(firstLine, text));
}

function toLines(digests: ReadonlyMap<string, BlobDigest>): string[] {
  return [...digests]
    .slice(-mostEntries)
    .map(([blob, { kind, sha256, bytes }]) => `${blob} ${kind} ${sha256} ${bytes}`);
}

const form = /^([0-9a-f]{40}|[0-9a-f]{64}) (content|pointer|extended-pointer) ([0-9a-f]{64}) (\d{1,15})$/;

/** A line of another form is left out: the file may come from another machine, and a digest becomes part of a path. */
function fromLines(lines: readonly string[]): Map<string, BlobDigest> {
  const digests = new Map<string, BlobDigest>();
  for (const line of lines) {
    const [, blob, kind, sha256, bytes] = form.exec(line) ?? [];
    if (blob !== undefined && sha256 !== undefined)
      digests.set(blob, { kind: kind as BlobDigest['kind'], sha256, bytes: Number(bytes) });
  }
  return digests;
}
