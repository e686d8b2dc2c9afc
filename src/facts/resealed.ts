import { judgeStandings } from '../records/standing.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { differencesOf } from './differences.ts';
import type { Facts } from './facts.ts';

/** A figure as it was computed for the seal of the base, and for the seal that is there now. */
export interface FigureChange {
  readonly name: string;
  readonly before: number | string;
  readonly now: number | string;
}

/**
 * What changed in records since the commit that this state is compared with and was sealed anew, so that nothing else tells
 * of it: how they stand against the seals of then, their data's differences, and by record id the figures that moved.
 */
export interface Resealed extends Pick<Facts, 'standings' | 'differences'> {
  readonly figures: ReadonlyMap<string, readonly FigureChange[]>;
}

export async function resealedOf(
  { records, standings, sealsBefore }: Facts,
  snapshot: Snapshot,
): Promise<Resealed> {
  const anew = new Map(
    [...judgeStandings(records, { seals: sealsBefore })].filter(
      ([id, { state }]) => state === 'stale' && standings.get(id)?.state === 'sealed',
    ),
  );
  const figures = [...anew].map(([id, { seal: was }]) => {
    const now = standings.get(id)?.seal?.facts ?? {};
    return [
      id,
      Object.entries(was?.facts ?? {}).flatMap(([name, before]): readonly FigureChange[] => {
        const after = now[name];
        const moved = after?.computed_by === before.computed_by && after.value !== before.value;
        return moved ? [{ name, before: before.value, now: after.value }] : [];
      }),
    ] as const;
  });
  return {
    standings: anew,
    differences: await differencesOf(records, anew, snapshot),
    figures: new Map(figures),
  };
}
