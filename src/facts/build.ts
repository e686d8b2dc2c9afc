import type { Records } from '../records/record.ts';
import type { SealsFile } from '../records/seal.ts';
import { readSealsFile } from '../records/seals-file.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { balancesOf } from './balances.ts';
import { bandsOf } from './bands.ts';
import { scenariosOf } from './conditions.ts';
import { differencesOf } from './differences.ts';
import type { Facts } from './facts.ts';
import { parametersOf } from './parameters.ts';
import { profilesOf } from './profiles.ts';
import { rainYearsOf } from './rain-years.ts';
import { takeReadings } from './readings.ts';
import { restatedOf } from './restated.ts';
import { scoresOf } from './scores.ts';
import { seasonsOf } from './seasons.ts';
import { storesOf } from './store-drift.ts';

type GivenFacts =
  | 'manifest'
  | 'records'
  | 'sealsFile'
  | 'standings'
  | 'today'
  | 'before'
  | 'claimedElsewhere'
  | 'known'
  | 'phase';

/** What the rooms before this one, and the caller, give. */
export interface Given extends Pick<Facts, GivenFacts> {
  readonly snapshot: Snapshot;
}

/** Computes all that rules may ask about a manifest; reads only files that a rule needs. */
export async function buildFacts({ snapshot, ...given }: Given): Promise<Facts> {
  const { records, standings, sealsFile, before } = given;
  const rain = rainYearsOf(records, snapshot);
  const [
    sealsBefore,
    beside,
    readings,
    differences,
    restated,
    profiles,
    scores,
    rainYears,
    stores,
    seasons,
    balances,
    parameters,
    bands,
    scenarios,
  ] = await Promise.all([
    sealsOfBefore(sealsFile, snapshot),
    filesBeside(records, snapshot),
    takeReadings(records, snapshot),
    differencesOf(records, standings, snapshot),
    restatedOf(records, standings, before, snapshot),
    profilesOf(records, snapshot),
    scoresOf(records, snapshot),
    rain,
    rain.then((years) => storesOf(records, years, snapshot)),
    seasonsOf(records, snapshot),
    balancesOf(records, snapshot),
    parametersOf(records, snapshot),
    bandsOf(records, snapshot),
    scenariosOf(records, snapshot),
  ]);
  return Object.freeze({
    ...given,
    sealsBefore,
    beside,
    readings,
    differences,
    restated,
    profiles,
    scores,
    rainYears,
    stores,
    seasons,
    balances,
    parameters,
    bands,
    scenarios,
    found: [],
    record: (id: string) => records.nodes.get(id),
  });
}

/** Nearly always the seals are those of the commit before; then they are not read again. */
async function sealsOfBefore(now: SealsFile, snapshot: Snapshot): Promise<Facts['sealsBefore']> {
  const before = await snapshot.readBefore(now.path);
  if (before === null) return new Map();
  const same =
    now.exists && Buffer.compare(before, (await snapshot.read(now.path)) ?? new Uint8Array()) === 0;
  return same ? now.seals : readSealsFile(now.path, new TextDecoder().decode(before)).seals;
}

async function filesBeside({ nodes }: Records, snapshot: Snapshot): Promise<Facts['beside']> {
  const stated = [...nodes.values()].flatMap(({ elsewhere }) => elsewhere);
  const paths = stated.flatMap(({ path, sha256 }) => (sha256 === undefined ? [] : path));
  return new Map(
    await Promise.all(paths.map(async (path) => [path, await snapshot.fileBeside(path)] as const)),
  );
}
