/** Ids so that each comes after all that it rests on. */
export interface Arranged {
  readonly order: readonly string[];
  /** One circle, its first id repeated at the end; null where there is none. */
  readonly circle: readonly string[] | null;
  /** Ids in a circle or resting on one, however far. */
  readonly broken: ReadonlySet<string>;
}

/** Arranges ids, else in the order given. What is rested on but is no id itself (a field) is left out. */
export function arrange(restsOn: ReadonlyMap<string, readonly string[]>): Arranged {
  const order: string[] = [];
  const way: string[] = [];
  const state = new Map<string, 'on the way' | 'done' | 'broken'>();
  let circle: readonly string[] | null = null;

  const visit = (id: string): void => {
    state.set(id, 'on the way');
    way.push(id);
    let broken = false;
    for (const below of restsOn.get(id) ?? []) {
      if (!restsOn.has(below)) continue;
      if (!state.has(below)) visit(below);
      if (state.get(below) === 'on the way') circle ??= [...way.slice(way.indexOf(below)), below];
      if (state.get(below) !== 'done') broken = true;
    }
    way.pop();
    state.set(id, broken ? 'broken' : 'done');
    order.push(id);
  };
  for (const id of restsOn.keys()) if (!state.has(id)) visit(id);
  const broken = new Set([...state].flatMap(([id, one]) => (one === 'broken' ? [id] : [])));
  return { order, circle, broken };
}
