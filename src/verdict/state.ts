import type { Standing } from '../records/seal.ts';
import type { Means } from '../rules/rule.ts';
import type { RecordSummary, State } from './finding.ts';

/** Worst first: a record that says something false is in a worse state than one that says too little. */
const worstFirst = ['contradicted', 'stale', 'missing', 'incomplete', 'unsealed'] as const;

/** A record's state from what its findings make of it and how it stands against its seal. */
export function summarise(
  id: string,
  standing: Standing | undefined,
  means: ReadonlySet<Means>,
): RecordSummary {
  const seen = new Set<Means | 'sealed'>(means);
  if (standing !== undefined) seen.add(standing.state);
  const state: State = worstFirst.find((one) => seen.has(one)) ?? 'sound';
  const seal = standing?.state === 'sealed' ? standing.seal : null;
  return {
    id,
    state,
    grade: standing === undefined ? null : state === 'sound' && seal !== null ? seal.grade : 'stated',
    sealed_on: standing?.seal?.sealed_on ?? null,
    sealed_by: standing?.seal?.sealed_by ?? null,
  };
}
