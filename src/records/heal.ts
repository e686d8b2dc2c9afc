import type { Versions } from './conflict.ts';
import { followMoves } from './follow-moves.ts';
import type { Records } from './record.ts';
import { schemes as known, newest, type Schemes } from './schemes.ts';
import { grades, type Seal, type SealsFault, type SealsFile } from './seal.ts';
import { withChecksum } from './seal-entry.ts';
import { readSealsFile } from './seals-file.ts';
import { linksOf } from './standing.ts';

type Side = keyof Versions;

/** What was done about one record whose seal the sides of a merge do not share, or no longer proves what it did. */
export interface HealedRecord {
  readonly record: string;
  readonly kept: Side | 'both';
  readonly seal: Seal;
  /** Whether the kept seal fits the merged content; where not, the record is stale. */
  readonly fits: boolean;
  /** The kept seal came from a rerun that is not of this content. */
  readonly rerunDropped: boolean;
}

export interface Healed extends Pick<SealsFile, 'seals' | 'unreadable'> {
  readonly records: readonly HealedRecord[];
  /** What could not be read of a side, and on which. */
  readonly faults: readonly SealsFault[];
}

/**
 * Makes one seals file of the versions that a merge left. For each record the seal stays that fits the content as it is
 * merged now; where both do, the one of the better grade, then the later; where none does, the base's, or without a
 * base the better. A seal fits also where files or records were renamed since, and is then kept under the new names. A
 * record that is sealed on one side only stays sealed. An entry that can't be read stays as it is where no side has a seal
 * to put in its place. `records` are those of the merged content.
 */
export function healSeals(versions: Versions, records: Records, schemes: Schemes = known): Healed {
  const read = (side: Side): SealsFile => readSealsFile('', versions[side], newest(schemes).number);
  // What is wrong in the base was so before the merge, or is torn by the markers.
  const [base, ours, theirs] = [read('base').seals, read('ours'), read('theirs')];
  const fits = fitting(records, schemes);
  const [here, there] = [withNewNames(ours, records, fits), withNewNames(theirs, records, fits)];
  const seals = new Map<string, Seal>();
  const healed: HealedRecord[] = [];
  for (const record of [...new Set([...here.keys(), ...there.keys()])].sort()) {
    const chosen = choose(base.get(record), here.get(record), there.get(record), (seal) =>
      fits(record, seal),
    );
    if (chosen === null) continue;
    const { kept } = chosen;
    const isFit = fits(record, chosen.seal);
    const rerunDropped = chosen.seal.grade === 'rerun' && !isFit;
    const seal = rerunDropped ? withoutRerun(chosen.seal) : chosen.seal;
    seals.set(record, seal);
    if (kept !== 'both' || seal !== ours.seals.get(record))
      healed.push({ record, kept, seal, fits: isFit, rerunDropped });
  }
  const unreadable = new Map([...theirs.unreadable, ...ours.unreadable].filter(([id]) => !seals.has(id)));
  const faults = Object.entries({ 'this side': ours, 'the other side': theirs }).flatMap(([side, file]) =>
    file.faults.map((fault) => ({ ...fault, message: `On ${side} of the merge: ${fault.message}` })),
  );
  return { seals, unreadable, records: healed, faults };
}

/**
 * Of the seals that the sides of a merge have, those that fit the content as it is now, for the records whose own seal does
 * not: what was reviewed on either side stays reviewed, however the conflict in the seals file was settled. A seal that only
 * names keep from fitting, here as there, is none of a merge's: something was renamed since.
 */
export function recoverSeals(
  sides: readonly (readonly [kept: 'ours' | 'theirs', of: Pick<SealsFile, 'seals'>])[],
  { seals }: Pick<SealsFile, 'seals'>,
  records: Records,
  schemes: Schemes = known,
): readonly HealedRecord[] {
  const fits = fitting(records, schemes);
  const followed = withNewNames({ seals }, records, fits);
  const candidates = sides.map(([kept, before]) => ({
    kept,
    before: before.seals,
    of: withNewNames(before, records, fits),
  }));
  return [...records.nodes.keys()].flatMap((record) => {
    const own = seals.get(record);
    if (own !== undefined && fits(record, own)) return [];
    const moved = followed.get(record);
    const isMoved = moved !== undefined && fits(record, moved);
    const [best] = candidates
      .flatMap(({ kept, before, of }) => {
        const seal = of.get(record);
        const isAsked = !isMoved || before.get(record) === seal;
        return isAsked && seal !== undefined && fits(record, seal) ? { kept, seal } : [];
      })
      .sort((a, b) => better(a.seal, b.seal));
    return best === undefined ? [] : { record, ...best, fits: true, rerunDropped: false };
  });
}

type Fits = (record: string, seal: Seal) => boolean;

/** The seals of a side, those that only names keep from fitting under the names of now. */
function withNewNames(
  file: Pick<SealsFile, 'seals'>,
  records: Records,
  fits: Fits,
): ReadonlyMap<string, Seal> {
  const seals = new Map(file.seals);
  const moved = followMoves(records, file);
  const from = new Map(moved.records.map((one) => [one.to, one.from]));
  for (const [record, seal] of moved.seals) {
    if (!fits(record, seal)) continue;
    seals.set(record, seal);
    seals.delete(from.get(record) ?? '');
  }
  return seals;
}

/** Whether a seal fits a record as it is now, by the scheme that the seal was made with. */
function fitting(records: Records, schemes: Schemes): Fits {
  const linksBy = linksOf(records, schemes);
  return (record, seal) => linksBy(seal.scheme).digests.get(record) === seal.digest;
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
  const suited = sides.filter(({ seal }) => fits(seal));
  if (suited.length === 0 && sides.length === 2 && base !== undefined) return { kept: 'base', seal: base };
  return (suited.length > 0 ? suited : sides).sort((a, b) => better(a.seal, b.seal))[0] ?? null;
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
