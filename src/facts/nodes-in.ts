import type { Area, RecordNode, Records } from '../records/record.ts';

/** The records of an area, in their order. */
export function nodesIn<A extends Area>(nodes: Records['nodes'], area: A): readonly RecordNode<A>[] {
  return [...nodes.values()].filter((node): node is RecordNode<A> => node.area === area);
}
