import type { Versions } from './conflict.ts';
import type { Records } from './record.ts';
import { schemes as known, newest, type Schemes } from './schemes.ts';
import { grades, type Seal, type SealsFault } from './seal.ts';
import { withChecksum } from './seal-entry.ts';
import { readSealsFile } from './seals-file.ts';
import { linksOf } from './standing.ts';

type Side = keyof Versions;

/** What was done about one record whose seal the sides of a merge do not share, or no longer proves what it did. */
export interface HealedRecord {
  readonly record: string;
  readonly kept: Side | 'both';
  /** Whether the kept seal fits the merged content; where not, the record is stale. */
  readonly fits: boolean;
  /** The kept seal came from a rerun that is not of this content. */
  readonly rerunDropped: boolean;
}

export interface Healed {
  readonly seals: ReadonlyMap<string, Seal>;
  readonly records: readonly HealedRecord[];
  /** What could not be read of a side, and so is not in the outcome. */
  readonly faults: readonly (SealsFault & { readonly side: Side })[];
}

/**
 * Makes one seals file of the versions that a merge left. For each record the seal stays that fits the content as it is
 * merged now; where both do, the one of the better grade, then the later; where none does, the base's, or without a
 * base the better. A record that is sealed on one side only stays sealed. `records` are those of the merged content.
 */
export function healSeals(versions: Versions, records: Records, schemes: Schemes = known): Healed {
  const faults: (SealsFault & { side: Side })[] = [];
  const read = (side: Side): ReadonlyMap<string, Seal> => {
    const file = readSealsFile('', versions[side], newest(schemes).number);
    // What is wrong in the base was so before the merge, or is torn by the markers.
    if (side !== 'base') faults.push(...file.faults.map((fault) => ({ ...fault, side })));
    return file.seals;
  };
  const [base, ours, theirs] = [read('base'), read('ours'), read('theirs')];
  const linksBy = linksOf(records, schemes);
  const seals = new Map<string, Seal>();
  const healed: HealedRecord[] = [];
  for (const record of [...new Set([...ours.keys(), ...theirs.keys()])].sort()) {
    const fits = (seal: Seal): boolean => linksBy(seal.scheme).digests.get(record) === seal.digest;
    const chosen = choose(base.get(record), ours.get(record), theirs.get(record), fits);
    if (chosen === null) continue;
    const { kept, seal } = chosen;
    const rerunDropped = seal.grade === 'rerun' && !fits(seal);
    seals.set(record, rerunDropped ? withoutRerun(seal) : seal);
    if (kept !== 'both' || rerunDropped) healed.push({ record, kept, fits: fits(seal), rerunDropped });
  }
  return { seals, records: healed, faults };
}
function choose(
  base: Seal | undefined,
  ours: Seal | undefined,
  theirs: Seal | undefined,
  fits: (seal: Seal) => boolean,
): { readonly kept: HealedRecord['kept']; readonly seal: Seal } | null {
  const sides = [
    ...(ours === undefined ? [] : [{ kept: 'ours' as const, seal: ours }]),
    ...(theirs === undefined ? [] : [{ kept: 'theirs' as const, seal: theirs }]),
  ];
  if (ours?.checksum === theirs?.checksum && ours !== undefined) return { kept: 'both', seal: ours };
  const fitting = sides.filter(({ seal }) => fits(seal));
  if (fitting.length === 0 && sides.length === 2 && base !== undefined) return { kept: 'base', seal: base };
  return (fitting.length > 0 ? fitting : sides).sort((a, b) => better(a.seal, b.seal))[0] ?? null;
}

/** The better grade first, then the later day; the checksum decides between equals, so that both sides heal alike. */
function better(a: Seal, b: Seal): number {
  const byGrade = grades.indexOf(b.grade) - grades.indexOf(a.grade);
  const key = (seal: Seal): string => seal.sealed_on + seal.checksum;
  return byGrade !== 0 ? byGrade : key(a) > key(b) ? -1 : 1;
}

function withoutRerun({ checksum: _, ...seal }: Seal): Seal {
  return withChecksum({ ...seal, grade: 'sealed' });
}
