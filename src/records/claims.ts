import type { FileIdentity, Snapshot } from '../repository/snapshot.ts';
import { type FindPaths, pathFinder } from './find-paths.ts';
import type { NamedFile } from './named-files.ts';
import { fromTop } from './paths.ts';
import type { Claim, Elsewhere, Unmatched } from './record.ts';
import { isStoplogFile } from './seals-path.ts';

/** A path or pattern, and the record that writes it. */
export interface NamedBy {
  readonly record: string;
  readonly file: NamedFile;
}

/** What records say of files, met with what there is. */
export interface Claimed {
  /** By record, then by path. */
  readonly claims: ReadonlyMap<string, ReadonlyMap<string, Claim>>;
  readonly elsewhere: ReadonlyMap<string, readonly Elsewhere[]>;
  readonly unmatched: readonly Unmatched[];
  /** Every path that is named at all. */
  readonly paths: ReadonlySet<string>;
}

type Found = NamedBy & { readonly paths: readonly string[] };

/** Finds the files that records name, and identifies them all at once. */
export async function claimFiles(
  named: readonly NamedBy[],
  find: FindPaths,
  folder: string,
  snapshot: Pick<Snapshot, 'identify' | 'untracked' | 'onDisk'>,
): Promise<Claimed> {
  const findUntracked = pathFinder(snapshot.untracked, folder);
  const elsewhere = new Map<string, Elsewhere[]>();
  const unmatched: Unmatched[] = [];
  const miss = ({ record, file: { pattern, field } }: NamedBy, why: Unmatched['why']): void => {
    const untracked = why === 'no-match' ? (findUntracked(pattern)?.paths ?? []) : [];
    unmatched.push({ record, pattern, field, why, untracked, ignored: [] });
  };

  const candidates: Found[] = [];
  for (const one of named) {
    const { record, file } = one;
    const found = find(file.pattern);
    if (found === null) miss(one, 'outside-repository');
    else if (file.use === 'elsewhere' && (file.stated !== undefined || found.paths.length === 0)) {
      const { sha256, bytes, location } = file.stated ?? {};
      const before = elsewhere.get(record) ?? [];
      elsewhere.set(record, [...before, { path: found.whole, sha256, bytes, location, field: file.field }]);
    }
    // A path that is no entry may still lead somewhere, through a link to a folder.
    else candidates.push({ ...one, paths: found.paths.length > 0 ? found.paths : [found.whole] });
  }
  const away = new Set([...elsewhere.values()].flatMap((files) => files.map(({ path }) => path)));

  const identities = await snapshot.identify(new Set(candidates.flatMap(({ paths }) => paths)));
  const found = candidates.map((one): Found => {
    const whys = new Map(one.paths.map((path) => [path, whyUnavailable(identities.get(path))]));
    const paths = one.paths.filter(
      (path) => whys.get(path) !== 'absent' && whys.get(path) !== 'link-outside' && !isStoplogFile(path),
    );
    const isKnownElsewhere = one.file.use !== 'read' && one.paths.every((path) => away.has(path));
    if ([...whys.values()].includes('link-outside')) miss(one, 'outside-repository');
    else if (paths.length === 0 && !isKnownElsewhere) miss(one, 'no-match');
    return { ...one, paths };
  });
  return {
    claims: claimsOf(found, identities),
    elsewhere,
    unmatched: await Promise.all(unmatched.map((one) => withIgnored(one, folder, snapshot))),
    paths: new Set([...found.flatMap(({ paths }) => paths), ...away]),
  };
}

/** A file may lie on disk and be ignored by git; the person who wrote the pattern wants to hear it. */
async function withIgnored(
  one: Unmatched,
  folder: string,
  snapshot: Pick<Snapshot, 'onDisk'>,
): Promise<Unmatched> {
  if (one.why !== 'no-match' || one.untracked.length > 0) return one;
  return { ...one, ignored: await snapshot.onDisk(fromTop(folder, one.pattern)) };
}

function whyUnavailable(identity: FileIdentity | undefined): string | null {
  return identity?.kind === 'unavailable' ? identity.why : null;
}

/** What enters digests: neither what is only looked at, nor what the run that gives it answers for. */
function claimsOf(
  found: readonly Found[],
  identities: ReadonlyMap<string, FileIdentity>,
): ReadonlyMap<string, ReadonlyMap<string, Claim>> {
  const homes = new Set(
    found.filter(isHome).flatMap(({ record, paths }) => paths.map((path) => `${record}\0${path}`)),
  );
  const claims = new Map<string, Map<string, Claim>>();
  for (const { record, file, paths } of found) {
    if (file.use === 'seen') continue;
    const own = isHome({ file });
    const byPath = claims.get(record) ?? new Map<string, Claim>();
    claims.set(record, byPath);
    for (const path of paths) {
      const identity = identities.get(path);
      const isRuns = file.use === 'given' && homes.has(`${file.run}\0${path}`);
      if (identity === undefined || isRuns || (byPath.has(path) && !own)) continue;
      byPath.set(path, { path, own, field: file.field, identity });
    }
  }
  return new Map([...claims].map(([record, byPath]) => [record, sorted(byPath)]));
}

/** A record is the home of its own files, also of one in git while others of its files are kept elsewhere. */
function isHome({ file: { use } }: Pick<NamedBy, 'file'>): boolean {
  return use === 'own' || use === 'elsewhere';
}

function sorted(claims: ReadonlyMap<string, Claim>): ReadonlyMap<string, Claim> {
  return new Map([...claims].sort(([a], [b]) => (a < b ? -1 : 1)));
}
