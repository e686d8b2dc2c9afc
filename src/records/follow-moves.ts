import { sha256OfJson } from './canonical.ts';
import { digestOf } from './digest.ts';
import { sha256ByPath } from './link.ts';
import { partsOf } from './parts.ts';
import { fromTop } from './paths.ts';
import type { RecordNode, Records } from './record.ts';
import { Renames } from './renames.ts';
import type { Seal, SealsFile } from './seal.ts';
import { withChecksum } from './seal-entry.ts';

export interface MovedFile {
  readonly record: string;
  /** From the top of the repository. */
  readonly from: string;
  readonly to: string;
}

export interface FollowedMoves {
  readonly seals: ReadonlyMap<string, Seal>;
  readonly files: readonly MovedFile[];
  readonly records: readonly { readonly from: string; readonly to: string }[];
  /** Renamed files (paths) or records (ids) of which nobody can tell which is which. */
  readonly ambiguous: readonly {
    readonly record: string;
    readonly from: readonly string[];
    readonly to: readonly string[];
  }[];
}

/**
 * Gives seals the new addresses of files and records that were renamed without a change of content; person and date
 * stay. A file is followed where its record named one file with those bytes before and names one elsewhere now; a
 * record where one seal without a record and one record without a seal state the same. Seals of records above follow
 * what they rest on. Anything else that changed stays stale.
 */
export function followMoves(records: Records, { seals }: Pick<SealsFile, 'seals'>): FollowedMoves {
  const renames = new Renames();
  for (;;) {
    const known = renames.size;
    const followed = follow(records, seals, renames);
    // A statement may name what comes after it, as an input does the one that it is compared with.
    if (renames.size === known) return followed;
  }
}

/** Follows once, with the renames that are known; adds those that it finds. */
function follow(records: Records, before: ReadonlyMap<string, Seal>, renames: Renames): FollowedMoves {
  const { manifest, nodes } = records;
  const seals = new Map(before);
  const redigested = new Map<string, { readonly was: string; readonly now: string }>();
  const files: MovedFile[] = [];
  const renamed: { from: string; to: string }[] = [];
  const ambiguous: Ambiguous[] = [];

  for (const node of nodes.values()) {
    const origin = before.has(node.id) ? [node.id] : orphansLike(node);
    const rivals = origin[0] === node.id ? [node.id] : origin.flatMap(unsealedLike);
    const [id] = origin;
    const seal = before.get(id ?? '');
    if (id === undefined || seal === undefined) continue;
    if (origin.length > 1 || rivals.length > 1) {
      ambiguous.push({ record: node.id, from: origin, to: rivals });
      continue;
    }
    const pairs = pairFiles(seal, node, manifest.folder);
    for (const { from, to } of pairs.moved) {
      renames.addFile(from, to);
      files.push({ record: node.id, from: fromTop(manifest.folder, from), to: fromTop(manifest.folder, to) });
    }
    for (const { from, to } of pairs.unclear) {
      const top = (path: string): string => fromTop(manifest.folder, path);
      ambiguous.push({ record: node.id, from: from.map(top), to: to.map(top) });
    }
    if (id !== node.id) {
      renames.addRecord(id, node.id);
      renamed.push({ from: id, to: node.id });
      seals.delete(id);
    }
    const now = readdress(seal, node, pairs);
    seals.set(node.id, now);
    redigested.set(node.id, { was: seal.digest, now: now.digest });
  }
  return { seals, files, records: renamed, ambiguous };

  function readdress(seal: Seal, node: RecordNode, pairs: Pairs): Seal {
    const movedTo = new Map(pairs.moved.map(({ from, to }) => [from, to]));
    const sealedFiles = Object.entries(seal.files).map(
      ([path, file]) => [movedTo.get(path) ?? path, file] as const,
    );
    const substance = statesTheSame(node, seal, renames) ? node.substance : seal.substance;
    const rests_on = Object.fromEntries(
      Object.entries(seal.rests_on).map(([address, digest]) => {
        const below = renames.idNow(address);
        const one = redigested.get(below);
        return [below, one?.was === digest ? one.now : digest];
      }),
    );
    const sha256s = Object.fromEntries(sealedFiles.map(([path, { sha256 }]) => [path, sha256]));
    const digest = digestOf({ scheme: seal.scheme, substance, files: sha256s, rests_on });
    if (digest === seal.digest) return seal;
    const driven_by = Object.fromEntries(
      Object.entries(seal.driven_by).map(([name, sha256]) => [
        movedTo.get(name) ?? renames.idNow(name),
        sha256,
      ]),
    );
    const { checksum: _, ...rest } = seal;
    const sealed = Object.fromEntries(sealedFiles);
    return withChecksum({ ...rest, substance, files: sealed, rests_on, digest, driven_by });
  }

  function statesTheSame(node: RecordNode, seal: Seal, known: Renames): boolean {
    if (seal.substance === node.substance) return true;
    return sha256OfJson(known.asBefore(partsOf(node, manifest).substance)) === seal.substance;
  }

  /** Seals without a record that are of the same area, statement and files as a record. */
  function orphansLike(node: RecordNode): readonly string[] {
    return [...before.keys()].filter((id) => !nodes.has(id) && isLike(node, id));
  }

  function unsealedLike(orphan: string): readonly string[] {
    return [...nodes.values()]
      .filter((node) => !before.has(node.id) && isLike(node, orphan))
      .map(({ id }) => id);
  }

  function isLike(node: RecordNode, orphan: string): boolean {
    const seal = before.get(orphan);
    if (seal === undefined || !orphan.startsWith(`${node.area}.`)) return false;
    const pairs = pairFiles(seal, node, manifest.folder);
    const known = renames.copy();
    for (const { from, to } of pairs.moved) known.addFile(from, to);
    return pairs.isAll && statesTheSame(node, seal, known);
  }
}

type Ambiguous = FollowedMoves['ambiguous'][number];

interface Pairs {
  readonly moved: readonly { readonly from: string; readonly to: string }[];
  readonly unclear: readonly { readonly from: readonly string[]; readonly to: readonly string[] }[];
  /** Every file of the seal is there with its bytes, and no other. */
  readonly isAll: boolean;
}

/** Files that the seal names and the record no longer does, met by content with those that it names since. */
function pairFiles(seal: Seal, { claims }: RecordNode, folder: string): Pairs {
  const now = new Map(Object.entries(sha256ByPath(claims, folder)));
  const was = new Map(Object.entries(seal.files).map(([path, { sha256 }]) => [path, sha256]));
  const gone = pathsBySha256(was, now);
  const fresh = pathsBySha256(now, was);
  const shared = [...gone].flatMap(([sha256, from]) => {
    const to = fresh.get(sha256);
    return to === undefined ? [] : [{ from, to }];
  });
  const moved = shared.flatMap(({ from: [from = '', ...others], to: [to = '', ...more] }) =>
    others.length + more.length === 0 ? [{ from, to }] : [],
  );
  const isSame = [...was].every(([path, sha256]) => !now.has(path) || now.get(path) === sha256);
  return {
    moved,
    unclear: shared.filter(({ from, to }) => from.length + to.length > 2),
    isAll: isSame && moved.length === gone.size && moved.length === fresh.size,
  };
}

/** Paths of one state that the other does not have, by content. */
function pathsBySha256(
  those: ReadonlyMap<string, string | null>,
  without: ReadonlyMap<string, string | null>,
): ReadonlyMap<string, readonly string[]> {
  const found = new Map<string, string[]>();
  for (const [path, sha256] of those) {
    if (sha256 === null || without.has(path)) continue;
    found.set(sha256, [...(found.get(sha256) ?? []), path]);
  }
  return found;
}
