import type { Snapshot } from '../repository/snapshot.ts';
import type { Comparison, ManifestVerdict } from '../verdict/finding.ts';
import { isUnread } from '../verdict/judge.ts';

/** What a state is compared with. */
export interface Against extends Pick<Comparison, 'asked' | 'strict' | 'unavailable'> {
  /** The state of the base; null where there is none to be had. */
  readonly base: Snapshot | null;
  /** Whether it is one of several from which the two histories could be said to part. */
  readonly crossed: boolean;
}

/**
 * What a reader has to know of a comparison. `before` holds the manifests of the base; `now` the paths of those of now, null where
 * only some were asked about; `former` the paths in the base of moved ones, by their paths now.
 */
export function compared(
  { asked, strict, unavailable, base, crossed }: Against,
  before: readonly ManifestVerdict[],
  now: readonly string[] | null,
  former: ReadonlyMap<string, string>,
): Comparison {
  const others = crossed
    ? [
        `${asked} and this were merged crosswise and have several newest commits in common. This is compared with ${base?.label} alone; what only another of them brought counts as new. Merge ${asked} into this to have one again.`,
      ]
    : [];
  const moved = [...former].map(([path, was]) => `${path} is compared with ${was} of ${base?.label}.`);
  const kept = now === null ? null : new Set([...now, ...former.values()]);
  const notes = before.flatMap((manifest) => [
    ...(kept === null || kept.has(manifest.path)
      ? []
      : [`${manifest.path} is gone since ${base?.label}: the model that it governed is no longer checked.`]),
    ...(isUnread(manifest)
      ? [`${manifest.path} could not be read in ${base?.label}, so all that is found in it counts as new.`]
      : []),
  ]);
  const isFirst = base !== null && now !== null && before.length === 0;
  const first = isFirst
    ? [
        `${base.label} holds no manifest yet, so all that is found counts as new. Once this one is committed, changes are compared with it.`,
      ]
    : [];
  return { asked, strict, unavailable, notes: [...others, ...moved, ...first, ...notes] };
}
