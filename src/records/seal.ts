import type { FileIdentity } from '../repository/snapshot.ts';

/** How strong the evidence for a sound record is, weakest first. */
export const grades = ['stated', 'sealed', 'recomputed', 'rerun'] as const;
export type Grade = (typeof grades)[number];

/** A file as it was when sealed; `sha256` is null where its content could not be verified then. */
export interface SealedFile {
  readonly sha256: string | null;
  readonly bytes: number | null;
  readonly blob: string | null;
}

/** One entry of `stoplog.seals.json`: what a named person looked at. */
export interface Seal {
  /** Number of the scheme by which the digest was made. */
  readonly scheme: number;
  readonly substance: string;
  readonly wording: string;
  /** SHA-256 of each acceptance that the record had. */
  readonly accepts: readonly string[];
  /** Path from the manifest's folder -> the file. */
  readonly files: Readonly<Record<string, SealedFile>>;
  /** Record id or field address -> its digest. */
  readonly rests_on: Readonly<Record<string, string>>;
  readonly digest: string;
  /** SHA-256 of what the record itself brings forth: a run's outputs, the values of parameters; null for all others. */
  readonly outcome: string | null;
  /**
   * What the outcome came from: record id, field address or path -> SHA-256 of what of it can move the outcome (an input's
   * data, a model's executables, the values of parameters, else all that is stated); null where it could not be verified.
   */
  readonly driven_by: Readonly<Record<string, string | null>>;
  /** What of these had changed since the seal before while the outcome had not. */
  readonly unmoved: readonly string[];
  /** Figures as they were computed when sealed, with the version of each computation. */
  readonly facts: Readonly<Record<string, { readonly value: number | string; readonly computed_by: number }>>;
  /** `Name <email>` as git knows them. */
  readonly sealed_by: string;
  /** ISO 8601 date. */
  readonly sealed_on: string;
  readonly grade: Exclude<Grade, 'stated'>;
  /** Why it was sealed though its outcome had not moved; null in the ordinary case. */
  readonly because: string | null;
  /** SHA-256 over the canonical JSON of all the fields above. */
  readonly checksum: string;
}

/** What a seals file turned out to be. A fault never hides the entries that could be read. */
export interface SealsFile {
  /** From the top of the repository. */
  readonly path: string;
  readonly exists: boolean;
  readonly seals: ReadonlyMap<string, Seal>;
  /** By record: entries at fault as they stand, so that sealing other records keeps them. */
  readonly unreadable: ReadonlyMap<string, unknown>;
  /** Broken JSON, conflict markers, an entry that was edited by hand (its checksum fails). */
  readonly faults: readonly SealsFault[];
}

export interface SealsFault {
  readonly kind: 'not-json' | 'conflict' | 'edited' | 'shape' | 'newer-scheme';
  /** The record whose entry is at fault; null for the whole file. */
  readonly record: string | null;
  readonly line: number;
  readonly message: string;
}

/** One thing that is not as it was when sealed. */
export type Change =
  | { readonly kind: 'substance' }
  | {
      readonly kind: 'file';
      readonly path: string;
      /** Null for a file that the seal does not know. */
      readonly was: SealedFile | null;
      /** Null for a file that is gone. */
      readonly now: FileIdentity | null;
    }
  | {
      readonly kind: 'rests-on';
      readonly id: string;
      readonly was: string | null;
      readonly now: string | null;
    };

/** Where a stale record's trouble begins. */
export interface Trail {
  /** From the record down to the record or field whose own content changed, as `evaluation.outlet-flow`, `runs.calibrated`, `inputs.rainfall`. */
  readonly steps: readonly string[];
  /** The changed file at the end, if the root is a file. */
  readonly path: string | null;
}

/** How a record stands against its seal. */
export interface Standing {
  readonly record: string;
  readonly seal: Seal | null;
  readonly state: 'unsealed' | 'stale' | 'sealed';
  /** Only prose differs from the seal. */
  readonly reworded: boolean;
  /** The seal was made under an older scheme, and by that scheme it still holds. */
  readonly oldScheme: boolean;
  /** Empty unless stale. Own changes (substance, files) come first. */
  readonly changes: readonly Change[];
  /** One for each root, shortest first; empty unless stale. */
  readonly trails: readonly Trail[];
  /** Acceptances (places in the record's list) that were given for an earlier state of the record. */
  readonly fallen: readonly number[];
}
