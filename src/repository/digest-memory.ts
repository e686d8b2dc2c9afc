import { createHash, randomUUID } from 'node:crypto';
import { mkdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';

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

/** The memory of a repository, in `stoplog/digests` below its common git directory. */
export async function openDigestMemory(commonDirectory: string): Promise<DigestMemory> {
  const file = join(commonDirectory, 'stoplog', 'digests');
  const known = await load(file);
  const fresh = new Map<string, BlobDigest>();
  return {
    get: (blob) => fresh.get(blob) ?? known.get(blob),
    set: (blob, digest) => fresh.set(blob, digest),
    async save() {
      if (fresh.size === 0) return;
      // Another run may have saved meanwhile; what it found is as true as ours.
      const all = new Map([...(await load(file)), ...fresh]);
      const temporary = `${file}.${randomUUID()}`;
      try {
        await mkdir(dirname(file), { recursive: true });
        await writeFile(temporary, digestsToText(all));
        await rename(temporary, file);
      } catch {
        await rm(temporary, { force: true }).catch(() => {});
      }
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

async function load(file: string): Promise<Map<string, BlobDigest>> {
  const text = await readFile(file, 'latin1').catch(() => '');
  return digestsFromText(text);
}

/** One line each, oldest first, and last the digest of all lines before, so that a torn or altered file shows. */
export function digestsToText(digests: ReadonlyMap<string, BlobDigest>): string {
  const lines = [...digests]
    .slice(-mostEntries)
    .map(([blob, { kind, sha256, bytes }]) => `${blob} ${kind} ${sha256} ${bytes}\n`);
  const body = `${firstLine}\n${lines.join('')}`;
  return `${body}${digestOf(body)}\n`;
}

/** Empty for a file that is not exactly as `digestsToText` wrote it. */
export function digestsFromText(text: string): Map<string, BlobDigest> {
  const digests = new Map<string, BlobDigest>();
  const end = text.lastIndexOf('\n', text.length - 2) + 1;
  const body = text.slice(0, end);
  if (!body.startsWith(`${firstLine}\n`) || text.slice(end) !== `${digestOf(body)}\n`) return digests;
  for (const line of body.split('\n').slice(1, -1)) {
    const [blob, kind, sha256, bytes] = line.split(' ') as [string, BlobDigest['kind'], string, string];
    digests.set(blob, { kind, sha256, bytes: Number(bytes) });
  }
  return digests;
}

const digestOf = (text: string) => createHash('sha256').update(text, 'latin1').digest('hex');
