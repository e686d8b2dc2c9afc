import type { ScoredWindow, StatedName } from '../../facts/scores/stated.ts';
import type { WindowFigures } from '../../facts/scores/window-figures.ts';
import type { TargetFigures } from '../../facts/scores.ts';
import { isDefined } from '../../hydrology/paired.ts';

/** What was recomputed over a window; null where nothing could be. */
export function recomputedOver(
  figures: TargetFigures | undefined,
  window: ScoredWindow,
): WindowFigures | null {
  if (figures === undefined || !isDefined(figures.recomputed)) return null;
  const over = figures.recomputed.value.windows[window];
  return over !== undefined && isDefined(over) ? over.value : null;
}

/** A score to judge by: recomputed and unrounded, or where that can't be, as it is stated. Null for none. */
export function scoreOver(
  figures: TargetFigures | undefined,
  window: ScoredWindow,
  score: Exclude<StatedName, 'peaks_hit'>,
): number | null {
  const recomputed = recomputedOver(figures, window)?.scores[score];
  if (recomputed !== undefined) return isDefined(recomputed) ? recomputed.value : null;
  const stated = figures?.stated.find((one) => one.window === window && one.score === score);
  return stated?.printed.value ?? null;
}
