import type { Facts } from '../facts/facts.ts';
import type { FieldPath, Problem } from '../manifest/manifest.ts';
import type { Area, RecordNode } from '../records/record.ts';

/** How far a study has come, in order. A rule starts to block at a phase. */
export const phases = ['setup', 'calibration', 'validation', 'application', 'archive'] as const;
export type Phase = (typeof phases)[number];

/** From when a finding blocks: a phase (before it the finding is a note), or `warn` for never. */
export type From = Phase | 'warn';

/** What a finding makes of its record; null for a doubt that leaves the record's state alone. */
export type Means = 'missing' | 'incomplete' | 'contradicted' | 'stale' | 'unsealed' | null;

/** What a rule found, before levels, departures, acceptances and waivers are applied. */
export interface Draft {
  /** The record's id, or `manifest` for the file as a whole. */
  readonly record: string;
  /** What is wrong and why it matters, in a hydrologist's words. Whole sentences, no full stop needed at the end of a fragment. */
  readonly message: string;
  /** The manifest field at fault: gives file, line and column. */
  readonly field?: FieldPath;
  /** Where the fault stands if not in the manifest: path from the top of the repository, and line from 1. */
  readonly file?: string;
  readonly line?: number;
  readonly column?: number;
  readonly stated?: string | number;
  readonly found?: string | number;
  readonly unit?: string;
  /** For a stale record: from the record down to the bytes. */
  readonly trail?: readonly string[];
  /** What tells this finding from others of the same rule on the same record (a parameter, a file, a choice): part of the fingerprint, so never a wording, a figure or a line. */
  readonly subject?: string;
  /** Where this finding's level differs from its rule's. */
  readonly from?: From;
  /** The level before `from`; `note` unless said. */
  readonly before?: 'note' | 'warn';
  /** The next step, where it differs from the rule's. */
  readonly clear?: string;
  /** Extra lines for the text report, such as the difference in a series. */
  readonly detail?: readonly string[];
}

/** A number that a rule compares with, and that a project may set otherwise by a departure. */
export interface Limit {
  readonly default: number;
  readonly unit: string;
  readonly states: string;
  /** Which way a departure asks for less. */
  readonly looser: 'higher' | 'lower';
}

/** Limits by name as the rule sees them: defaults with the project's departures applied. */
export type Limits = Readonly<Record<string, number>>;

export interface Source {
  /** `published`: a paper, handbook or standard. `definition`: follows from the words. `practice`: common practice without a published source. `house`: our own choice. */
  readonly basis: 'published' | 'definition' | 'practice' | 'house';
  /** The full citation for `published`; else a short reason. */
  readonly citation: string;
}

/** A manifest that could not be read: all that can be said of it. */
export interface UnreadManifest {
  readonly path: string;
  readonly problems: readonly Problem[];
}

/**
 * What a rule is asked about: `file`, a manifest that can't be read (no facts then); `manifest`, the manifest as
 * a whole; or an area: each of its records, and a placeholder where an area of one record is absent.
 */
export type Scope = 'file' | 'manifest' | Area;

type Asked<S extends Scope> = S extends Area ? RecordNode<S> : S extends 'file' ? UnreadManifest : null;
type Given<S extends Scope> = S extends 'file' ? null : Facts;

export interface Rule<S extends Scope = Scope> {
  /** `area.what-is-wrong`, as in the README's table. */
  readonly id: string;
  readonly scope: S;
  readonly from: From;
  readonly before?: 'note' | 'warn';
  readonly means: Means;
  /** A truthful but uncomfortable result: blocks only while no acceptance in its record answers for it. */
  readonly acceptable?: true;
  /** Rules of the second pass see what the first found (`facts.found`). */
  readonly second?: true;
  /** When it fires, in a sentence. */
  readonly statement: string;
  /** Why it matters to a hydrologist. */
  readonly why: string;
  readonly source: Source;
  /** How to clear it. */
  readonly clear: string;
  /** By name; the departure's threshold is `<area of the id>.<name>`. */
  readonly limits?: Readonly<Record<string, Limit>>;
  /** Pure: no file, git, clock or locale. Returns data; never throws. */
  check(record: Asked<S>, facts: Given<S>, limits: Limits): readonly Draft[];
}

/** Fixes the scope's type so that `check` gets the record it asked for. */
export function rule<const S extends Scope>(definition: Rule<S>): Rule<S> {
  return definition;
}
