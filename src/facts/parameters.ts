import type { RecordNode, Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { type InModel, parametersInModel } from './parameters/in-model.ts';
import { type OwnTable, ownTables } from './parameters/own-tables.ts';
import { type ReadParameters, statedParameters } from './parameters/stated.ts';

/** The parameters of a manifest, in the record and its table, and what they are held against. */
export interface ParameterFacts extends ReadParameters {
  /** In the order of `values`; empty where the record names no file of the model. */
  readonly inModel: readonly InModel[];
  /** Handbook tables of the project's own, by name. */
  readonly ownTables: ReadonlyMap<string, OwnTable>;
}

export async function parametersOf(
  { manifest, nodes }: Records,
  snapshot: Snapshot,
): Promise<ParameterFacts> {
  const record = nodes.get('parameters') as RecordNode<'parameters'> | undefined;
  if (record === undefined) return { values: [], unread: [], inModel: [], ownTables: new Map() };
  const read = await statedParameters(record, manifest, snapshot);
  return {
    ...read,
    inModel: await parametersInModel(read.values, record.fragment.model_file, manifest, snapshot),
    ownTables: await ownTables(record.fragment.handbook_tables, manifest, snapshot),
  };
}
