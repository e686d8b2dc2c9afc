import { type Blobs, blobOf } from './blobs.ts';
import { contentOf } from './content.ts';
import { forgetfulMemory } from './digest-memory.ts';
import { byPath, type Listing } from './listing.ts';
import { objectId } from './object-id.ts';
import type { Entry, Snapshot } from './snapshot.ts';
import { forgetfulValues } from './value-memory.ts';

/** A file's content, as text (UTF-8) or bytes, or where a symbolic link leads. */
export type FileInMemory = string | Uint8Array | { readonly link: string };

export type FilesInMemory = Readonly<Record<string, FileInMemory>>;

/**
 * A snapshot of files that are on no disk, by path from the top; ids and digests are those that git and
 * SHA-256 give. Content that a Git LFS pointer names is never there. `before` holds the files of the commit
 * that this state follows.
 */
export function snapshotFromMemory(files: FilesInMemory, before: FilesInMemory = {}): Snapshot {
  const contents = new Map<string, Uint8Array>();
  const entries: Entry[] = [];
  for (const [path, file] of Object.entries(files)) {
    const isLink = typeof file === 'object' && 'link' in file;
    const content = new Uint8Array(Buffer.from(isLink ? file.link : file));
    const blob = objectId('blob', content, 'sha1');
    contents.set(blob, content);
    entries.push({ path, mode: isLink ? '120000' : '100644', blob });
  }
  const listing: Listing = { entries: byPath(entries), unmerged: [], intentToAdd: [] };
  return Object.freeze({
    at: { kind: 'worktree' } as const,
    label: 'files in memory',
    commit: null,
    ...listing,
    untracked: [],
    onDisk: async () => [],
    ...contentOf(listing, blobsOf(contents), async () => null, {
      digests: forgetfulMemory(),
      left: new Map(),
    }),
    readBefore: async (path: string) => snapshotFromMemory(before).read(path),
    fileBeside: async () => null,
    remember: forgetfulValues().remember,
    close: async () => {},
  });
}

function blobsOf(contents: ReadonlyMap<string, Uint8Array>): Blobs {
  const open = (id: string) => {
    const content = contents.get(id);
    return content === undefined ? null : blobOf(content);
  };
  return {
    async visit(ids, visitor) {
      for (const id of ids) await visitor(id, open(id));
    },
    async sizes(ids) {
      return new Map(ids.flatMap((id) => (contents.has(id) ? [[id, contents.get(id)?.length ?? 0]] : [])));
    },
    open: async (id) => open(id),
    close: async () => {},
  };
}
