/** The level of a finding as it counts in this run. */
export type Level = 'block' | 'warn' | 'note';

/** One thing that a rule found, as reports and dossier see it. Keys as in the JSON report. */
export interface Finding {
  readonly rule: string;
  readonly level: Level;
  readonly record: string;
  readonly message: string;
  /** From the top of the repository. */
  readonly file: string;
  readonly line: number;
  readonly column: number;
  readonly stated: string | number | null;
  readonly found: string | number | null;
  readonly unit: string | null;
  readonly trail: readonly string[];
  readonly detail: readonly string[];
  readonly source: string;
  readonly clear: string;
  /** The base revision had it already, and the record it concerns has not changed since. */
  readonly standing: boolean;
  /** The waiver or acceptance that lets it pass, as `reason (person, date)`; null when none does. */
  readonly waived: string | null;
  readonly accepted: string | null;
  /** Of rule, record and subject; never of wording, figures or lines. */
  readonly fingerprint: string;
}

export type State = 'missing' | 'incomplete' | 'unsealed' | 'stale' | 'contradicted' | 'sound';

export interface RecordSummary {
  readonly id: string;
  readonly state: State;
  readonly grade: string | null;
  readonly sealed_on: string | null;
  readonly sealed_by: string | null;
}

/** A departure in force, said in every verdict. */
export interface DepartureSummary {
  readonly of: string;
  readonly now: string;
  readonly because: string;
  readonly loosens: boolean;
}

/** A finding that the base revision had and that is gone. */
export interface Cured {
  readonly rule: string;
  readonly record: string;
  /** As it was said of the base. */
  readonly message: string;
  readonly fingerprint: string;
}

/** A record that was sealed anew since the base, with what moved in its data and figures, a line each. */
export interface Changed {
  readonly record: string;
  readonly what: readonly string[];
}

export interface ManifestVerdict {
  readonly path: string;
  readonly study: string | null;
  readonly phase: string;
  readonly records: readonly RecordSummary[];
  readonly findings: readonly Finding[];
  readonly departures: readonly DepartureSummary[];
  /** Empty where nothing was compared. */
  readonly cured: readonly Cured[];
  /** Empty where nothing was compared. */
  readonly changed: readonly Changed[];
}

export interface Totals {
  readonly records: number;
  readonly sound: number;
  readonly block: number;
  readonly warn: number;
  readonly note: number;
  readonly waived: number;
  readonly accepted: number;
  /** Findings that the base revision had already and nobody's word lets pass; counted under their level too only in a strict run. */
  readonly standing: number;
  /** Findings of the base revision that are gone. */
  readonly cured: number;
}

/** What came of the wish to compare with a base revision. */
export interface Comparison {
  /** The revision as it was asked for. */
  readonly asked: string;
  /** Whether standing findings block too. */
  readonly strict: boolean;
  /** Why nothing could be compared, so that every finding counts as new, and what to do about it; null where it was compared. */
  readonly unavailable: string | null;
  /** What a reviewer should know about the comparison, in whole sentences: a manifest that is gone, or that could not be read in the base. */
  readonly notes: readonly string[];
}

/** The outcome of one check: the JSON report's content. */
export interface Verdict {
  readonly format: 'stoplog-findings/1';
  readonly at: string;
  /** The commit that was compared with: where the checked state left the base that was asked for. Null where nothing was compared. */
  readonly base: string | null;
  /** Null where no base was asked for. */
  readonly comparison: Comparison | null;
  readonly manifests: readonly ManifestVerdict[];
  readonly totals: Totals;
  readonly verdict: 'pass' | 'blocked';
}
