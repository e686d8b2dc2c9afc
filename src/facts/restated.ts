import { isDeepStrictEqual } from 'node:util';
import { type FieldPath, fieldName, type Manifest } from '../manifest/manifest.ts';
import { sha256OfJson } from '../records/canonical.ts';
import { resolvePattern } from '../records/find-paths.ts';
import { partsOf, substanceByField } from '../records/parts.ts';
import type { Records } from '../records/record.ts';
import type { Standing } from '../records/seal.ts';
import { statementsOf } from '../records/statements.ts';
import type { Snapshot } from '../repository/snapshot.ts';

/** A field of a record that says otherwise than when it was sealed. */
export interface RestatedField {
  /** Below the record, as `series.unit`; entries of a list that have names go by them. */
  readonly field: string;
  /** Undefined where nothing was, or is, stated. */
  readonly was: unknown;
  readonly now: unknown;
}

/**
 * For each record whose own statement changed since it was sealed: what changed in it. Records whose sealed statement is not
 * the one in the commit before are left out: a seal keeps no more of a statement than its digest.
 */
export async function restatedOf(
  { nodes, manifest }: Records,
  standings: ReadonlyMap<string, Standing>,
  before: Manifest | null,
  snapshot: Snapshot,
): Promise<ReadonlyMap<string, readonly RestatedField[]>> {
  const changed = [...standings.values()].filter(({ changes }) =>
    changes.some(({ kind }) => kind === 'substance'),
  );
  if (before === null || changed.length === 0) return new Map();
  const { statements } = await statementsOf(before, async (pattern) => {
    const place = resolvePattern(before.folder, pattern);
    const bytes = place === null ? null : await snapshot.readBefore(place.root + place.rest);
    return bytes === null ? null : new TextDecoder().decode(bytes);
  });
  return new Map(
    changed.flatMap(({ record, seal }) => {
      const [was, now] = [statements.get(record), nodes.get(record)];
      if (was === undefined || now === undefined) return [];
      if (sha256OfJson(partsOf(was, before).substance) !== seal?.substance) return [];
      const fields = differing(substanceByField(was, before), substanceByField(now, manifest), []);
      return [[record, fields] as const];
    }),
  );
}

function differing(was: unknown, now: unknown, at: FieldPath): readonly RestatedField[] {
  if (isDeepStrictEqual(was, now)) return [];
  const [old, current] = [byKey(was), byKey(now)];
  const found =
    old === null || current === null
      ? []
      : [...new Set([...old.keys(), ...current.keys()])].flatMap((key) =>
          differing(old.get(key), current.get(key), [...at, key]),
        );
  return found.length > 0 ? found : [{ field: fieldName(at), was, now }];
}

/** The entries of a map, or of a list of maps by their names (their places where not all have one); null for all else. */
function byKey(value: unknown): ReadonlyMap<string | number, unknown> | null {
  if (isMap(value)) return new Map(Object.entries(value));
  if (!Array.isArray(value) || !value.every(isMap)) return null;
  const named = new Map(value.map((item) => [String(item.name), item]));
  return named.size === value.length && value.every(({ name }) => name !== undefined)
    ? named
    : new Map(value.entries());
}

function isMap(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
