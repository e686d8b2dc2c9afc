import type { Manifest } from '../manifest/manifest.ts';
import { splitFragment } from '../manifest/substance.ts';
import { arrange } from './arrange.ts';
import { sha256OfJson } from './canonical.ts';
import { digestOf } from './digest.ts';
import { holderOf, keysBelow, representedSettings, settingsAddress, valueAt } from './field.ts';
import { type Reference, resolveName } from './names.ts';
import { fromFolder } from './paths.ts';
import { type Claim, type RecordNode, sha256Of } from './record.ts';
import type { Scheme } from './schemes.ts';
import type { Statement } from './statements.ts';

/** A record before it is known what it rests on. */
export type Unlinked = Omit<RecordNode, 'restsOn' | 'digest'>;

/** What rests on what, and every digest, as one scheme has it. */
export interface Links {
  /** The scheme's number. */
  readonly scheme: number;
  readonly restsOn: ReadonlyMap<string, readonly string[]>;
  /** By record id and field address. Records in or above a circle have none. */
  readonly digests: ReadonlyMap<string, string>;
}

export interface Linked extends Links {
  /** Record ids; what others rest on comes first. */
  readonly order: readonly string[];
  readonly circle: readonly string[] | null;
  /** References to nothing, with the record that makes them. */
  readonly unresolved: readonly { readonly record: string; readonly reference: Reference }[];
}

/** Links the records of a manifest by a scheme, and digests them all from the content that they have now. */
export function linkRecords(
  scheme: Scheme,
  manifest: Manifest,
  records: ReadonlyMap<string, Unlinked>,
): Linked {
  const stated = { manifest, statements: records as unknown as ReadonlyMap<string, Statement> };
  const restsOn = new Map<string, readonly string[]>();
  const unresolved: { record: string; reference: Reference }[] = [];
  for (const [record, statement] of stated.statements) {
    const on = new Set<string>();
    for (const reference of scheme.restsOn(statement, stated)) {
      const resolved = resolveName(reference.to, stated);
      if (resolved === null) unresolved.push({ record, reference });
      for (const id of resolved ?? []) on.add(id);
    }
    restsOn.set(record, [...on].sort());
  }
  const { order, circle, broken } = arrange(restsOn);
  const digests = new Map<string, string>();
  for (const id of order) {
    const record = records.get(id);
    if (record === undefined) continue;
    const below = restsOn.get(id) ?? [];
    for (const address of below) {
      if (!records.has(address))
        digests.set(address, digests.get(address) ?? digestOfField(address, records));
    }
    if (broken.has(id)) continue;
    const rests_on = Object.fromEntries(below.map((one) => [one, digests.get(one) ?? '']));
    const files = sha256ByPath(record.claims, manifest.folder);
    digests.set(id, digestOf({ scheme: scheme.number, substance: record.substance, files, rests_on }));
  }
  return { scheme: scheme.number, order, circle, restsOn, digests, unresolved };
}

/** Path from the manifest's folder -> SHA-256, null where the content could not be verified. */
export function sha256ByPath(
  claims: ReadonlyMap<string, Claim>,
  folder: string,
): Record<string, string | null> {
  return Object.fromEntries(
    [...claims.values()].map(({ path, identity }) => [fromFolder(folder, path), sha256Of(identity)]),
  );
}

/** SHA-256 of what a field states; for settings of interventions, of the contents of their files, whatever they are called. */
function digestOfField(address: string, records: ReadonlyMap<string, Unlinked>): string {
  const holder = holderOf(address, records);
  if (holder === undefined) return sha256OfJson(null);
  if (address === settingsAddress) {
    const places = representedSettings(holder as Statement);
    const claims = [...holder.claims.values()].filter(
      ({ field: [, place, key] }) => key === 'settings' && typeof place === 'number' && places.has(place),
    );
    return sha256OfJson(claims.map(({ identity }) => sha256Of(identity)));
  }
  const { substance } = splitFragment(holder.field, holder.fragment);
  return sha256OfJson(valueAt(substance, keysBelow(holder.id, address)) ?? null);
}
