import { nodesIn } from '../../facts/nodes-in.ts';
import type { Records } from '../../records/record.ts';

/** The record of the first scenario that is driven by a condition: where something about the condition itself is said once. */
export function firstCase(condition: string, { nodes }: Records): string | undefined {
  return nodesIn(nodes, 'scenarios').find(({ fragment }) => fragment.drivers?.[condition] !== undefined)?.id;
}
