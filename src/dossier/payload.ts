import type { Entry, FileIdentity, Unavailable } from '../repository/snapshot.ts';
import type { DossierContent } from './content.ts';

/** A file of the revision whose bytes are here, and go into a bag at `payloadPath(path)`. */
export interface PayloadFile {
  /** From the top of the repository. */
  readonly path: string;
  readonly sha256: string;
  readonly bytes: number;
  readonly executable: boolean;
}

/** A file kept outside git that a bag names in its `fetch.txt`. */
export interface FetchedFile {
  readonly path: string;
  readonly sha256: string;
  /** Null where the manifest does not state it. */
  readonly bytes: number | null;
  /** Absolute, http or https, as it stands in `fetch.txt`. */
  readonly url: string;
}

/** A file that belongs to the study and can lie in no package that is made here. */
export interface AbsentFile {
  readonly path: string;
  readonly sha256: string | null;
  readonly bytes: number | null;
  /** For people: why it is not in the package. */
  readonly why: string;
  /** Where the manifest says that it is kept; null where it does not. */
  readonly location: string | null;
}

/** The study's files, each once, every list in code-unit order of path. */
export interface Payload {
  readonly files: readonly PayloadFile[];
  readonly fetched: readonly FetchedFile[];
  readonly absent: readonly AbsentFile[];
}

const whyUnavailable: Readonly<Record<Unavailable, string>> = {
  'not-fetched': 'its content is not in this clone',
  submodule: 'it is a repository of its own, of which only a commit is named here',
  'link-outside': 'it is a link that leads out of the repository',
  'link-dangling': 'it is a link that leads to no file',
  unmerged: 'it has a merge conflict',
  'intent-to-add': 'it has no content yet',
  absent: 'there is no such file',
};

/**
 * What of the study lies in a bag, what it names to be fetched, and what it can't hold: tracked files in the manifests' folders,
 * files elsewhere in the repository that records name, and files kept outside git.
 */
export async function payloadOf({ snapshot, studies }: DossierContent): Promise<Payload> {
  const nodes = studies.flatMap(({ facts }) => [...facts.records.nodes.values()]);
  const folders = studies.map(({ facts }) => facts.manifest.folder);
  const inFolder = (path: string) => folders.some((folder) => folder === '' || path.startsWith(`${folder}/`));
  const claimed = nodes.flatMap(({ claims }) => [...claims.keys()]);
  const paths = [...new Set([...[...snapshot.entries.keys()].filter(inFolder), ...claimed])].sort();

  const files: PayloadFile[] = [];
  const fetched: FetchedFile[] = [];
  const absent: AbsentFile[] = [];
  for (const [path, identity] of await snapshot.identify(paths)) {
    const why = whyAbsent(identity);
    const { sha256 = null, bytes = null } = identity.kind === 'unavailable' ? {} : identity;
    if (why !== null || sha256 === null || bytes === null) {
      absent.push({ path, sha256, bytes, why: why ?? whyUnavailable.absent, location: null });
    } else files.push({ path, sha256, bytes, executable: isExecutable(snapshot.entries.get(path)) });
  }

  const seen = new Set(paths);
  for (const { path, sha256 = null, bytes = null, location = null } of nodes.flatMap(
    (node) => node.elsewhere,
  )) {
    if (seen.has(path)) continue;
    seen.add(path);
    const url = location === null ? null : fetchUrl(location);
    if (sha256 !== null && url !== null) fetched.push({ path, sha256: sha256.toLowerCase(), bytes, url });
    else absent.push({ path, sha256, bytes, why: whyNotFetched(sha256), location });
  }
  return { files: files.sort(byPath), fetched: fetched.sort(byPath), absent: absent.sort(byPath) };
}

/** A file that no package made here holds, with how it is to be had. */
export interface OutsideFile {
  readonly path: string;
  readonly sha256: string | null;
  readonly bytes: number | null;
  readonly note: string;
}

/** All that a bag names to be fetched or can't hold, in code-unit order of path. */
export function outsideFiles({ fetched, absent }: Payload): readonly OutsideFile[] {
  const files = [
    ...fetched.map(({ path, sha256, bytes, url }) => ({
      path,
      sha256,
      bytes,
      note: `to be fetched from ${url}`,
    })),
    ...absent.map(({ path, sha256, bytes, why, location }) => ({
      ...{ path, sha256, bytes },
      note: location === null ? why : `${why}; it is kept at ${location}`,
    })),
  ];
  return files.sort(byPath);
}

/** A location as an address that anybody can fetch; null for all others, and for one that holds a name or a password. */
export function fetchUrl(location: string): string | null {
  if (!URL.canParse(location)) return null;
  const url = new URL(location);
  const isWeb = url.protocol === 'http:' || url.protocol === 'https:';
  return isWeb && url.username === '' && url.password === '' ? url.href : null;
}

function whyAbsent(identity: FileIdentity): string | null {
  if (identity.kind === 'unavailable') return whyUnavailable[identity.why];
  return identity.kind === 'pointer' && !identity.present
    ? 'its Git LFS content was not fetched here; the SHA-256 is the one that the pointer names'
    : null;
}

function whyNotFetched(sha256: string | null): string {
  return sha256 === null
    ? 'it is kept outside git and the manifest states no SHA-256 of it'
    : 'it is kept outside git and the manifest gives no web address from which anybody can fetch it';
}

function isExecutable(entry: Entry | undefined): boolean {
  return entry?.mode === '100755';
}

function byPath(a: { readonly path: string }, b: { readonly path: string }): number {
  return a.path < b.path ? -1 : 1;
}
