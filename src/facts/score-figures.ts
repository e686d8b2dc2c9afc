import { isDefined } from '../hydrology/paired.ts';
import type { RecordNode } from '../records/record.ts';
import type { Facts } from './facts.ts';
import type { Figure } from './figures.ts';
import { type ScoredWindow, type StatedName, scoredWindows } from './scores/stated.ts';
import { recomputedScore, type TargetFigures } from './scores.ts';

/** Decimals of a score that is not stated yet. */
const usualDecimals = 2;

/** What is written for a window that has no scores: one of each kind, and KGE. */
const usualScores: readonly StatedName[] = ['nse', 'pbias', 'r2', 'kge'];

/**
 * Scores that are not what the files give, and those of windows that have none. Scores in a table, and of a fragment that stands
 * for many records, are left alone: the manifest has no place for them.
 */
export function scoreFigures({ records, scores }: Pick<Facts, 'records' | 'scores'>): readonly Figure[] {
  return [...scores].flatMap(([name, figures]) => {
    const record = records.nodes.get(`evaluation.${name}`) as RecordNode<'evaluation'>;
    if (record.fragment.scores?.table !== undefined || record.field.at(-1) !== name) return [];
    return scoredWindows.flatMap((window) => figuresOver(window, figures, record));
  });
}

function figuresOver(
  window: ScoredWindow,
  figures: TargetFigures,
  { id, field }: RecordNode,
): readonly Figure[] {
  const stated = figures.stated.filter((score) => score.window === window);
  const missing = stated.length > 0 ? [] : usualScores.map((score) => ({ score, printed: null }));
  return [...stated.filter(({ agrees }) => !agrees), ...missing].flatMap(({ score, printed }) => {
    const found = recomputedScore(figures.recomputed, window, score);
    if (!isDefined(found)) return [];
    // One decimal would make an NSE of 0.97 perfect.
    const fewest = Math.abs(found.value) < 2 ? usualDecimals : 0;
    const decimals = Math.min(100, Math.max(fewest, printed?.decimals ?? usualDecimals));
    return {
      record: id,
      field: [...field, 'scores', window, score],
      stated: printed?.value ?? null,
      found: Number(found.value.toFixed(decimals)),
    };
  });
}
