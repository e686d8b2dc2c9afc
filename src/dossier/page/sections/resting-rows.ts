import type { Facts } from '../../../facts/facts.ts';
import { holderOf } from '../../../records/field.ts';
import type { RecordNode } from '../../../records/record.ts';
import type { ManifestVerdict } from '../../../verdict/finding.ts';
import type { RestingRow, RestsOn } from '../../charts/rests-on.ts';

const worstFirst = ['contradicted', 'stale', 'missing', 'incomplete', 'unsealed', 'sound'];

/**
 * Rows for the picture of what rests on what. Records that one fragment stands for are one row. Of the edges only those remain that no
 * longer way implies; what rests on a single field of a record does not rest on what that record rests on.
 */
export function restingRows(
  { records: { nodes }, standings }: Facts,
  verdict: ManifestVerdict,
): { readonly rows: readonly RestingRow[]; readonly edges: readonly RestsOn[] } {
  const groups = groupsOf(nodes);
  const states = new Map(verdict.records.map(({ id, state }) => [id, state as string]));
  const rowOf = new Map(groups.flatMap(({ members }, row) => members.map(({ id }) => [id, row] as const)));
  const rowAt = (id: string) => rowOf.get(holderOf(id, nodes)?.id ?? id);
  const edgesOf = (members: readonly RecordNode[], from: number) => {
    const all = new Map<number, boolean>();
    for (const id of members.flatMap(({ restsOn }) => restsOn)) {
      const to = rowAt(id);
      if (to !== undefined && to !== from) all.set(to, nodes.has(id) || all.get(to) === true);
    }
    return all;
  };
  const direct = groups.map(({ members }, row) => edgesOf(members, row));
  const reach = new Map<number, ReadonlySet<number>>();
  const reachOf = (row: number): ReadonlySet<number> => {
    const known = reach.get(row);
    if (known !== undefined) return known;
    const found = new Set<number>();
    reach.set(row, found);
    for (const [to, isWhole] of direct[row] ?? [])
      for (const further of isWhole ? [to, ...reachOf(to)] : [to]) found.add(further);
    return found;
  };
  const stale = new Set(
    [...standings.values()].flatMap(({ trails }) =>
      trails.flatMap(({ steps }) =>
        steps.slice(1).map((step, place) => `${rowAt(steps[place] ?? '')} ${rowAt(step)}`),
      ),
    ),
  );
  const edges = direct.flatMap((below, from) =>
    [...below.keys()]
      .map((to) => ({ from, to, isStale: stale.has(`${from} ${to}`) }))
      .filter(
        ({ to, isStale }) =>
          isStale ||
          ![...below].some(([other, isWhole]) => isWhole && other !== to && reachOf(other).has(to)),
      )
      .sort((one, other) => one.to - other.to),
  );
  const rows = groups.map(({ name, members }): RestingRow => {
    const worst = worstFirst.find((state) => members.some(({ id }) => states.get(id) === state));
    return { name, state: worst ?? 'unsealed' };
  });
  return { rows, edges };
}

interface Group {
  readonly name: string;
  readonly members: readonly RecordNode[];
}

function groupsOf(nodes: ReadonlyMap<string, RecordNode>): readonly Group[] {
  const byFragment = new Map<string, RecordNode[]>();
  for (const node of nodes.values()) {
    const fragment = node.field.join('.');
    const members = byFragment.get(fragment);
    if (members === undefined) byFragment.set(fragment, [node]);
    else members.push(node);
  }
  return [...byFragment].map(([fragment, members]) => {
    const [only] = members;
    return {
      name: members.length === 1 && only !== undefined ? only.id : `${fragment} × ${members.length}`,
      members,
    };
  });
}
