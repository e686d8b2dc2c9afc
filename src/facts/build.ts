import type { Records } from '../records/record.ts';
import type { SealsFile } from '../records/seal.ts';
import { readSealsFile } from '../records/seals-file.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { differencesOf } from './differences.ts';
import type { Facts } from './facts.ts';
import { parametersOf } from './parameters.ts';
import { takeReadings } from './readings.ts';
import { restatedOf } from './restated.ts';
import { workOut } from './work-out.ts';

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
  const [sealsBefore, beside, readings, differences, restated, parameters, figures] = await Promise.all([
    sealsOfBefore(sealsFile, snapshot),
    filesBeside(records, snapshot),
    takeReadings(records, snapshot),
    differencesOf(records, standings, snapshot),
    restatedOf(records, standings, before, snapshot),
    parametersOf(records, snapshot),
    workOut(records, snapshot),
  ]);
  return Object.freeze({
    ...given,
    sealsBefore,
    beside,
    readings,
    differences,
    restated,
    parameters,
    ...figures,
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
