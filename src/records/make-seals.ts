import { holderOf } from './field.ts';
import type { RecordNode, Records } from './record.ts';
import {
  fallenAcceptance,
  faultOf,
  type Refusal,
  restsOnRefused,
  unknownRecord,
  unmovedRefusal,
  unreadableSeals,
} from './refusal.ts';
import { schemes as known, newest, type Schemes } from './schemes.ts';
import { grades, type Seal, type SealsFile, type Standing } from './seal.ts';
import { withChecksum } from './seal-entry.ts';
import { type SealedContent, sealedContent } from './sealed-content.ts';
import { linksOf } from './standing.ts';
import { unmovedBelow } from './unmoved.ts';

/** What was computed about a record, and how far that proves it. */
export interface Evidence {
  readonly facts: Seal['facts'];
  readonly grade: Seal['grade'];
}

export interface SealRequest {
  readonly records: Records;
  readonly sealsFile: SealsFile;
  readonly standings: ReadonlyMap<string, Standing>;
  /** Record ids, or all. */
  readonly wanted: readonly string[] | 'all';
  /** Why a record is sealed though its outcome did not move; null where nobody says. */
  readonly because: string | null;
  /** `Name <email>`. */
  readonly person: string;
  /** ISO 8601 date. */
  readonly today: string;
  /** By record id. A record without evidence is `sealed` and has no facts. */
  readonly evidence: ReadonlyMap<string, Evidence>;
}

export interface Sealed {
  readonly record: string;
  readonly seal: Seal;
  /** The seal that it replaces. */
  readonly before: Seal | null;
  /** The entry that it replaces could not be read. */
  readonly replacesUnreadable: boolean;
  /** Not asked for: a wanted record rests on it. */
  readonly along: boolean;
  /** Paths whose content could not be verified. */
  readonly unverified: readonly string[];
}

export interface SealPlan {
  /** All seals as they will be; those that need not change are the very entries of before. */
  readonly seals: ReadonlyMap<string, Seal>;
  /** Entries at fault that stay in the file as they are, since their records are not sealed anew. */
  readonly unreadable: SealsFile['unreadable'];
  /** In the order of sealing: what others rest on comes first. */
  readonly sealed: readonly Sealed[];
  readonly refused: readonly Refusal[];
  /** Entries that will be gone: where all is sealed, those without a record. */
  readonly dropped: readonly string[];
}

/**
 * Plans the sealing of records, what they rest on first. Nothing is written. Seals that still fit are kept with
 * their person and date; a record that rests on a refused one is refused.
 */
export function makeSeals(request: SealRequest, schemes: Schemes = known): SealPlan {
  const { records, sealsFile, standings, wanted } = request;
  const { unreadable } = sealsFile;
  const fault = unreadableSeals(sealsFile);
  if (fault !== null)
    return { seals: sealsFile.seals, unreadable: new Map(), sealed: [], refused: [fault], dropped: [] };

  const links = linksOf(records, schemes)(newest(schemes).number);
  const { asked, refused } = askedRecords(wanted, records);
  const needed = withAllBelow(asked, records);
  const seals = new Map(sealsFile.seals);
  const sealed: Sealed[] = [];
  for (const [id, record] of records.nodes) {
    const standing = standings.get(id);
    if (standing === undefined || !needed.has(id)) continue;
    const evidence = request.evidence.get(id);
    const along = !asked.has(id);
    const fits = standing.state === 'sealed';
    if (fits && (along || isUpToDate(record, standing, evidence))) continue;

    const content = sealedContent(record, links, records);
    const before = standing.seal;
    const proof =
      fits && before !== null
        ? keptProof(before, evidence)
        : newProof(content, before, evidence, request.because);
    const below = record.restsOn.map((one) => refused.get(one)).find((one) => one !== undefined);
    const refusal =
      faultOf(record, records) ??
      (below === undefined ? null : restsOnRefused(id, below)) ??
      fallenAcceptance(standing) ??
      (proof.unmoved.length > 0 && proof.grade !== 'rerun' && proof.because === null
        ? unmovedRefusal(record, proof.unmoved)
        : null);
    if (refusal !== null) {
      refused.set(id, refusal);
      continue;
    }
    const seal = withChecksum({ ...content, ...proof, sealed_by: request.person, sealed_on: request.today });
    const unverified = [...record.claims.values()].filter(({ identity }) => identity.kind === 'unavailable');
    seals.set(id, seal);
    sealed.push({
      record: id,
      seal,
      before,
      replacesUnreadable: unreadable.has(id),
      along,
      unverified: unverified.map(({ path }) => path),
    });
  }
  const kept = new Map([...unreadable].filter(([id]) => !seals.has(id)));
  const orphans =
    wanted === 'all' ? [...seals.keys(), ...kept.keys()].filter((id) => !records.nodes.has(id)) : [];
  for (const id of orphans) for (const entries of [seals, kept]) entries.delete(id);
  return { seals, unreadable: kept, sealed, refused: [...refused.values()], dropped: orphans };
}

type Proof = Pick<Seal, 'facts' | 'grade' | 'unmoved' | 'because'>;

/** The content is new: what was known of it before counts no more. */
function newProof(
  content: SealedContent,
  before: Seal | null,
  { facts, grade }: Evidence = { facts: {}, grade: 'sealed' },
  because: string | null,
): Proof {
  const unmoved = before === null ? [] : unmovedBelow(before, content);
  return { facts, grade, unmoved, because: unmoved.length > 0 && grade !== 'rerun' ? because : null };
}

/** The content is what it was: what was known of it still holds, and may have grown. */
function keptProof(before: Seal, evidence: Evidence | undefined): Proof {
  const { facts = before.facts, grade = before.grade } = evidence ?? {};
  const { unmoved, because } = before;
  return { facts, grade: isStronger(grade, before.grade) ? grade : before.grade, unmoved, because };
}

function isStronger(grade: Seal['grade'], than: Seal['grade']): boolean {
  return grades.indexOf(grade) > grades.indexOf(than);
}

/** Whether a seal that fits would not say more if it were made anew. */
function isUpToDate(
  record: RecordNode,
  { seal, reworded, oldScheme }: Standing,
  evidence: Evidence | undefined,
): boolean {
  if (seal === null || reworded || oldScheme) return false;
  const sameAccepts = seal.accepts.join() === record.accepts.join();
  return sameAccepts && !(evidence !== undefined && isStronger(evidence.grade, seal.grade));
}

/** The records that names ask for: a record, all of an area (`inputs`), all made from one fragment (`inputs.gauge`). */
function askedRecords(wanted: SealRequest['wanted'], { nodes }: Records) {
  const ids = [...nodes.keys()];
  const asked = new Set<string>(wanted === 'all' ? ids : []);
  const refused = new Map<string, Refusal>();
  for (const name of wanted === 'all' ? [] : wanted) {
    const meant = ids.filter((id) => id === name || id.startsWith(`${name}.`));
    for (const id of meant) asked.add(id);
    if (meant.length === 0) refused.set(name, unknownRecord(name, ids));
  }
  return { asked, refused };
}

/**
 * The records asked for and all that they rest on. A field that is rested on brings its record along where that rests
 * on nothing itself, as `periods` does; else the two could each wait for the other.
 */
function withAllBelow(asked: ReadonlySet<string>, { nodes }: Records): ReadonlySet<string> {
  const all = new Set<string>();
  const add = (id: string): void => {
    if (all.has(id)) return;
    all.add(id);
    for (const below of nodes.get(id)?.restsOn ?? []) {
      const holder = holderOf(below, nodes);
      if (holder !== undefined && (holder.id === below || holder.restsOn.length === 0)) add(holder.id);
    }
  };
  for (const id of asked) add(id);
  return all;
}
