import { settingsAddress } from './field.ts';
import type { Change, Standing, Trail } from './seal.ts';

/**
 * The ways from a stale record down to what changed: each changed file, statement or field once, by the shortest
 * way, shortest first. A way ends where a record's own content changed, or at one that was sealed anew or not at all.
 */
export function findTrails(record: string, standings: ReadonlyMap<string, Standing>): readonly Trail[] {
  const trails: Trail[] = [];
  const reached = new Set([record]);
  let ways: (readonly string[])[] = [[record]];
  while (ways.length > 0) {
    const longer: (readonly string[])[] = [];
    for (const way of ways) {
      const changes = changesAt(way.at(-1) ?? record, standings);
      trails.push(...rootsAt(way, changes));
      for (const change of changes) {
        if (change.kind !== 'rests-on' || reached.has(change.id)) continue;
        reached.add(change.id);
        longer.push([...way, change.id]);
      }
    }
    ways = longer;
  }
  return trails;
}

function changesAt(id: string, standings: ReadonlyMap<string, Standing>): readonly Change[] {
  if (id !== settingsAddress) return standings.get(id)?.changes ?? [];
  return (standings.get('interventions')?.changes ?? []).filter(({ kind }) => kind === 'file');
}

/** Where nothing changed by what the last record's own seal says, the way ends there all the same. */
function rootsAt(steps: readonly string[], changes: readonly Change[]): readonly Trail[] {
  const own = changes.flatMap((change): readonly Trail[] => {
    if (change.kind === 'rests-on') return [];
    return [{ steps, path: change.kind === 'file' ? change.path : null }];
  });
  return changes.length === 0 ? [{ steps, path: null }] : own;
}
