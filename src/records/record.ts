import type { ManifestData } from '../manifest/data.generated.ts';
import type { FieldPath, Manifest } from '../manifest/manifest.ts';
import type { FileIdentity } from '../repository/snapshot.ts';

type Section<K extends keyof ManifestData> = NonNullable<ManifestData[K]>;
type Named<K extends keyof ManifestData> = NonNullable<Section<K>[keyof Section<K>]>;

/** The manifest fragment of a record, by area. */
export interface FragmentOf {
  study: Section<'study'>;
  catchment: Section<'catchment'>;
  model: Section<'model'>;
  inputs: Named<'inputs'>;
  periods: Section<'periods'>;
  setup: Section<'setup'>;
  parameters: Section<'parameters'>;
  runs: Named<'runs'>;
  evaluation: Named<'evaluation'>;
  balance: Named<'balance'>;
  interventions: Section<'interventions'>;
  uncertainty: Section<'uncertainty'>;
  scenarios: NonNullable<NonNullable<Section<'scenarios'>['cases']>[string]>;
}

export type Area = keyof FragmentOf;

/** Every area, in the order of the manifest's sections. */
export const areas = [
  'study',
  'catchment',
  'model',
  'inputs',
  'periods',
  'setup',
  'parameters',
  'runs',
  'evaluation',
  'balance',
  'interventions',
  'uncertainty',
  'scenarios',
] as const satisfies readonly Area[];

/** Areas whose key in the manifest holds one record for each name. */
export const namedAreas = ['inputs', 'runs', 'evaluation', 'balance', 'scenarios'] as const;

/** Stands for the record where something belongs to the manifest as a whole. */
export const asWhole = 'manifest';

/** A file that a record depends on. */
export interface Claim {
  /** From the top of the repository. */
  readonly path: string;
  /** True where the record is the file's home (an input's data, a run's outputs); false where it only reads it. */
  readonly own: boolean;
  readonly field: FieldPath;
  readonly identity: FileIdentity;
}

/** The digest of a file's content; null where it could not be verified. */
export function sha256Of(identity: FileIdentity): string | null {
  return identity.kind === 'unavailable' ? null : identity.sha256;
}

/** A file kept outside git, with what the manifest says of it. */
export interface Elsewhere {
  readonly path: string;
  readonly sha256: string | undefined;
  readonly bytes: number | undefined;
  readonly location: string | undefined;
  readonly field: FieldPath;
}

/** A path or pattern that names nothing usable in the snapshot. */
export interface Unmatched {
  readonly record: string;
  readonly pattern: string;
  readonly field: FieldPath;
  readonly why: 'no-match' | 'outside-repository';
  /** Files on disk that the pattern would name if git tracked them. */
  readonly untracked: readonly string[];
  /** Where there are none: files on disk that the pattern would name if git did not ignore them. */
  readonly ignored: readonly string[];
}

/** A name in the manifest that refers to no record. */
export interface UnknownName {
  readonly record: string;
  readonly name: string;
  readonly field: FieldPath;
  readonly nearest: string | undefined;
}

/** One record, with all that its digest is made of. */
export interface RecordNode<A extends Area = Area> {
  /** `model`, `inputs.rainfall`, `scenarios.dry-2050`. */
  readonly id: string;
  readonly area: A;
  /** The name below the area; null where the area holds one record only. */
  readonly name: string | null;
  /** False for the placeholder of an area that the manifest does not have; its fragment is then empty. */
  readonly present: boolean;
  readonly fragment: FragmentOf[A];
  readonly field: FieldPath;
  /** By path. */
  readonly claims: ReadonlyMap<string, Claim>;
  readonly elsewhere: readonly Elsewhere[];
  /** What its truth depends on: record ids, and addresses of single fields such as `periods.calibration`. Sorted, none twice. */
  readonly restsOn: readonly string[];
  /** SHA-256 of the canonical JSON of the keys that others depend on. */
  readonly substance: string;
  /** SHA-256 of the canonical JSON of its prose. */
  readonly wording: string;
  /** SHA-256 of each acceptance in the record, in the manifest's order. */
  readonly accepts: readonly string[];
  /** Of substance, files and the digests of what it rests on, all as they are now. */
  readonly digest: string;
}

/** All records of one manifest in one snapshot. */
export interface Records {
  readonly manifest: Manifest;
  /** Number of the scheme by which all this is linked and digested. */
  readonly scheme: number;
  /** Present records; what others rest on comes first, else in the manifest's order. */
  readonly nodes: ReadonlyMap<string, RecordNode>;
  /** Digest now of each record and field address that something rests on. */
  readonly digests: ReadonlyMap<string, string>;
  /** One circle of records that rest on each other, first repeated at the end; null when there is none. Records in or above a circle have no digest (empty string). */
  readonly circle: readonly string[] | null;
  readonly unmatched: readonly Unmatched[];
  readonly unknown: readonly UnknownName[];
  /** Tracked files under `covers` that no record names and `leaves_out` does not excuse. */
  readonly unaccounted: readonly string[];
}
