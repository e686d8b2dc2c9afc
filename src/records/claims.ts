import type { Snapshot } from '../repository/snapshot.ts';
import { type FindPaths, pathFinder, resolvePattern } from './find-paths.ts';
import type { NamedFile } from './named-files.ts';
import type { Claim, Elsewhere, Unmatched } from './record.ts';
import { isStoplogFile } from './seals-path.ts';

/** What each record says of files, met with what there is. */
export interface Claimed {
  /** By record, then by path. */
  readonly claims: ReadonlyMap<string, ReadonlyMap<string, Claim>>;
  readonly elsewhere: ReadonlyMap<string, readonly Elsewhere[]>;
  readonly unmatched: readonly Unmatched[];
  /** Every path that is named at all. */
  readonly named: ReadonlySet<string>;
}

interface Found {
  readonly record: string;
  readonly file: NamedFile;
  readonly paths: readonly string[];
}

/** Finds the files that records name, and identifies them all at once. */
export async function claimFiles(
  named: readonly { readonly record: string; readonly file: NamedFile }[],
  find: FindPaths,
  folder: string,
  snapshot: Pick<Snapshot, 'identify' | 'untracked'>,
): Promise<Claimed> {
  const findUntracked = pathFinder(snapshot.untracked, folder);
  const claims = new Map<string, Map<string, Claim>>();
  const elsewhere = new Map<string, Elsewhere[]>();
  const unmatched: Unmatched[] = [];
  const found: Found[] = [];

  const miss = (record: string, { pattern, field }: NamedFile, why: Unmatched['why']): void => {
    const untracked = why === 'no-match' ? (findUntracked(pattern) ?? []) : [];
    unmatched.push({ record, pattern, field, why, untracked });
  };
  for (const { record, file } of named) {
    const place = resolvePattern(folder, file.pattern);
    const matches = find(file.pattern);
    if (place === null || matches === null) {
      miss(record, file, 'outside-repository');
      continue;
    }
    const path = place.root + place.rest;
    if (file.use === 'elsewhere' && (file.stated !== undefined || matches.length === 0)) {
      const { sha256, bytes, location } = file.stated ?? {};
      const all = elsewhere.get(record) ?? [];
      elsewhere.set(record, [...all, { path, sha256, bytes, location, field: file.field }]);
      continue;
    }
    // A path that is no entry may still lead somewhere through a link to a folder.
    found.push({ record, file, paths: matches.length > 0 ? matches : [path] });
  }

  const identities = await snapshot.identify(new Set(found.flatMap((one) => one.paths)));
  const isAway = (path: string, why: string): boolean => {
    const identity = identities.get(path);
    return identity === undefined || (identity.kind === 'unavailable' && identity.why === why);
  };
  const awayPaths = new Set([...elsewhere.values()].flatMap((files) => files.map(({ path }) => path)));
  const owned = new Set<string>();
  const kept = found.map(({ record, file, paths: some }) => {
    const inside = some.filter((path) => !isAway(path, 'link-outside'));
    const here = inside.filter((path) => !isAway(path, 'absent') && !isStoplogFile(path));
    const isKnownElsewhere = file.use !== 'read' && some.every((path) => awayPaths.has(path));
    if (inside.length < some.length) miss(record, file, 'outside-repository');
    else if (here.length === 0 && !isKnownElsewhere) miss(record, file, 'no-match');
    if (isHome(file)) for (const path of here) owned.add(`${record}\0${path}`);
    return { record, file, paths: here };
  });
  for (const { record, file, paths: some } of kept) {
    if (file.use === 'seen') continue;
    const own = isHome(file);
    const byPath = claims.get(record) ?? new Map<string, Claim>();
    claims.set(record, byPath);
    for (const path of some) {
      if (file.use === 'given' && owned.has(`${file.run}\0${path}`)) continue;
      const identity = identities.get(path);
      const isBetter = own || !byPath.has(path);
      if (identity !== undefined && isBetter) byPath.set(path, { path, own, field: file.field, identity });
    }
  }
  return {
    claims: new Map([...claims].map(([record, byPath]) => [record, sorted(byPath)])),
    elsewhere,
    unmatched,
    named: new Set([...kept.flatMap((one) => one.paths), ...awayPaths]),
  };
}

/** A record is the home of its own files, also where most of them are kept elsewhere and this one is in git. */
function isHome({ use }: NamedFile): boolean {
  return use === 'own' || use === 'elsewhere';
}

function sorted(claims: ReadonlyMap<string, Claim>): ReadonlyMap<string, Claim> {
  return new Map([...claims].sort(([a], [b]) => (a < b ? -1 : 1)));
}
