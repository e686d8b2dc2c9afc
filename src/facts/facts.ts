import type { Statistic } from '../hydrology/paired.ts';
import type { Manifest } from '../manifest/manifest.ts';
import type { RecordNode, Records } from '../records/record.ts';
import type { Seal, SealsFile, Standing } from '../records/seal.ts';
import type { DiskFile } from '../repository/snapshot.ts';
import type { SeriesDifference } from '../series/difference.ts';
import type { VolumeFigures } from './balances.ts';
import type { BandFigures } from './bands.ts';
import type { ScenarioFigures } from './conditions.ts';
import type { ParameterFacts } from './parameters.ts';
import type { InputProfile } from './profiles.ts';
import type { RainYears } from './rain-years.ts';
import type { Reading } from './readings.ts';
import type { RestatedField } from './restated.ts';
import type { TargetFigures } from './scores.ts';
import type { SeasonFigures } from './seasons.ts';
import type { RunStores } from './store-drift.ts';

/** What one rule found, as far as rules of the second pass need it. */
export interface Found {
  readonly rule: string;
  readonly record: string;
  readonly subject?: string;
}

/** What departures, waivers and acceptances may name. Handed in by the caller: rules come after facts. */
export interface KnownRules {
  /** By rule id: the phase from which it blocks, or `warn`. */
  readonly rules: ReadonlyMap<string, string>;
  /** By threshold, such as `balance.residual_share`. */
  readonly limits: ReadonlyMap<string, { readonly default: number; readonly looser: 'higher' | 'lower' }>;
}

/** Everything that rules may ask about one manifest in one snapshot; computed before they run, frozen. */
export interface Facts {
  readonly manifest: Manifest;
  readonly records: Records;
  readonly sealsFile: SealsFile;
  /** By record id: the seals of the commit that this state is compared with; empty if there were none. */
  readonly sealsBefore: ReadonlyMap<string, Seal>;
  /** By record id; one for each present record. */
  readonly standings: ReadonlyMap<string, Standing>;
  /** The date of the verdict, ISO 8601. */
  readonly today: string;
  /** The manifest of the commit that this state is compared with; null if there was none or it can't be read. */
  readonly before: Manifest | null;
  /** Own files of records in other manifests of this snapshot: path to manifest and record. */
  readonly claimedElsewhere: ReadonlyMap<string, { readonly manifest: string; readonly record: string }>;
  /** Values taken from the model's own files, in the manifest's order. */
  readonly readings: readonly Reading[];
  /** For each changed file of a stale record that reads as a series: what changed, in the data's own terms. */
  readonly differences: ReadonlyMap<string, SeriesDifference>;
  /** By record id: what changed in the record's own statement, where its sealed statement is that of the commit before. */
  readonly restated: ReadonlyMap<string, readonly RestatedField[]>;
  /** By the name of the input: what its series' files hold. */
  readonly profiles: ReadonlyMap<string, InputProfile>;
  /** By the name of the evaluation target: what its files give, and what is stated. */
  readonly scores: ReadonlyMap<string, TargetFigures>;
  /** By path: what lies on disk where a record says that a file is kept outside git with a digest; null where nothing does. */
  readonly beside: ReadonlyMap<string, DiskFile | null>;
  /** By the name of the precipitation input: the rain of its complete years. */
  readonly rainYears: ReadonlyMap<string, Statistic<RainYears>>;
  /** By the name of the run: how its stores move after warm-up. */
  readonly stores: ReadonlyMap<string, RunStores>;
  /** For each stated season, in the manifest's order: how the simulated one lies to the observed. */
  readonly seasons: readonly Statistic<SeasonFigures>[];
  /** The calibrated conditions, and how far scenarios reach beyond them. */
  readonly scenarios: ScenarioFigures;
  /** By the name of the control volume: its water balance. */
  readonly balances: ReadonlyMap<string, VolumeFigures>;
  /** The parameters, in the record and its table. */
  readonly parameters: ParameterFacts;
  /** Uncertainty bands, in the manifest's order. */
  readonly bands: readonly BandFigures[];
  /** Findings of the first pass; empty during it. */
  readonly found: readonly Found[];
  readonly known: KnownRules;
  /** The phase in force: the manifest's, or the one asked for on the command line. */
  readonly phase: string;
  /** The present record of that id, or undefined. */
  record(id: string): RecordNode | undefined;
}
