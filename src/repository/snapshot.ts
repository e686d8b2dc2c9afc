/** Which content a verdict is about. */
export type At = { kind: 'worktree' } | { kind: 'index' } | { kind: 'revision'; revision: string };

/** Git's file modes: ordinary, executable, symbolic link, submodule. */
export type Mode = '100644' | '100755' | '120000' | '160000';

export interface Entry {
  /** From the top of the repository, with `/`. */
  readonly path: string;
  readonly mode: Mode;
  /** Git's object id (40 or 64 hexadecimal digits). */
  readonly blob: string;
}

/** What a tracked path stands for, and whether its content could be verified. */
export type FileIdentity =
  | { readonly kind: 'file'; readonly sha256: string; readonly bytes: number; readonly blob: string }
  /** A Git LFS pointer: the digest is that of the content it names. `present` when that content is here. */
  | {
      readonly kind: 'pointer';
      readonly sha256: string;
      readonly bytes: number;
      readonly blob: string;
      readonly present: boolean;
    }
  /** No digest: content not fetched, a submodule, a link that leaves the repository or leads nowhere. */
  | { readonly kind: 'unavailable'; readonly why: Unavailable; readonly blob: string | null };

/** A file on disk that need not be in git. */
export interface DiskFile {
  readonly sha256: string;
  readonly bytes: number;
}

export type Unavailable =
  | 'not-fetched'
  | 'submodule'
  | 'link-outside'
  | 'link-dangling'
  | 'unmerged'
  | 'intent-to-add'
  | 'absent';

/**
 * One frozen state of a repository: the work tree as `git add` would store it, the index, or a revision.
 * Everything is by path from the top of the repository; nothing here knows of manifests.
 */
export interface Snapshot {
  readonly at: At;
  /** For people: `work tree`, `staged for commit`, or the abbreviated commit id. */
  readonly label: string;
  /** The commit that this state is compared with by a reader: HEAD for work tree and index, the commit itself for a revision; null before the first commit. */
  readonly commit: string | null;
  /** Entries of stage 0, in code-unit order of path; without intent-to-add ones. */
  readonly entries: ReadonlyMap<string, Entry>;
  /** Paths with a merge conflict (index only; empty for the others). */
  readonly unmerged: readonly string[];
  /** Paths added by `git add -N`, with no content in the index. */
  readonly intentToAdd: readonly string[];
  /** Files on disk that git does not track: for messages only, never content of the snapshot. Empty for a revision. */
  readonly untracked: readonly string[];
  /** Files on disk that a pattern names, ignored ones too: for messages only. None for a revision. */
  onDisk(pattern: string): Promise<readonly string[]>;
  /** Digests, remembered by blob id; links followed inside the repository. Every asked path has an entry in the answer. */
  identify(paths: Iterable<string>): Promise<ReadonlyMap<string, FileIdentity>>;
  /** Whole content of a path (links followed, LFS content where present); null where it is unavailable. Throws Failure 'unreadable-file' above `limit` bytes. */
  read(path: string, limit?: number): Promise<Uint8Array | null>;
  /** The same as a stream, in chunks that the reader may keep only until the next one. */
  stream(path: string): AsyncIterable<Uint8Array>;
  /** Content of a blob by id, for showing what changed since a seal; null when the object is not in the repository. */
  readBlob(blob: string, limit?: number): Promise<Uint8Array | null>;
  /** Content of a path in the commit that this state follows (HEAD for work tree and index, the first parent for a revision); null where there is none. */
  readBefore(path: string): Promise<Uint8Array | null>;
  /** A file on disk at a path, for content that is kept outside git; null where it is not there, outside the repository, or where there is no work tree. */
  fileBeside(path: string): Promise<DiskFile | null>;
  /**
   * What `compute` gives, computed once in a run and kept between runs. The key must tell everything that the value depends
   * on: what is computed, the version of the computation, digests of the content (hex SHA-256 of all that together). Values are
   * what JSON can say (NaN becomes null, undefined is left out, at the first time too) and must not be changed.
   */
  remember<T>(key: string, compute: () => Promise<T>): Promise<T>;
  /** Ends git children and removes temporary files. */
  close(): Promise<void>;
}
