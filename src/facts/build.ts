import type { Snapshot } from '../repository/snapshot.ts';
import { differencesOf } from './differences.ts';
import type { Facts } from './facts.ts';
import { takeReadings } from './readings.ts';

/** What the rooms before this one, and the caller, give. */
export interface Given extends Omit<Facts, 'readings' | 'differences' | 'found' | 'record'> {
  readonly snapshot: Snapshot;
}

/** Computes all that rules may ask about a manifest; reads only files that a rule needs. */
export async function buildFacts({ snapshot, ...given }: Given): Promise<Facts> {
  const { records, standings } = given;
  const [readings, differences] = await Promise.all([
    takeReadings(records, snapshot),
    differencesOf(records, standings, snapshot),
  ]);
  return Object.freeze({
    ...given,
    readings,
    differences,
    found: [],
    record: (id: string) => records.nodes.get(id),
  });
}
