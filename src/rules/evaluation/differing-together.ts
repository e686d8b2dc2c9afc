import type { ComparedScore } from '../../facts/scores.ts';
import { isDefined } from '../../hydrology/paired.ts';

export type DifferingTogether = readonly [ComparedScore, ...ComparedScore[]];

/**
 * Scores that differ, those of one window together where one mistake explains them: one reason why they can't be recomputed,
 * the same likely cause, or no known cause while no score of the window agrees.
 */
export function differingTogether(stated: readonly ComparedScore[]): readonly DifferingTogether[] {
  const groups = new Map<string, [ComparedScore, ...ComparedScore[]]>();
  for (const score of stated) {
    const { window, agrees, recomputed, causes } = score;
    if (agrees) continue;
    const shared = isDefined(recomputed) ? causes : recomputed.undefined;
    const isApart = shared.length === 0 && stated.some((one) => one.window === window && one.agrees);
    const key = JSON.stringify([window, isApart ? score.score : shared]);
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [score]);
    else group.push(score);
  }
  return [...groups.values()];
}
