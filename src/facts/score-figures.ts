import { isDefined } from '../hydrology/paired.ts';
import type { RecordNode } from '../records/record.ts';
import type { Facts } from './facts.ts';
import type { Figure } from './figures.ts';
import { flowTargets, isScored, neededRegimes, scoresOfRegime, unscoredRegimes } from './scores/needs.ts';
import { type ScoredWindow, type StatedName, scoredWindows } from './scores/stated.ts';
import { recomputedScore, type TargetFigures } from './scores.ts';

/** Decimals of a score that is not stated yet. */
const usualDecimals = 2;

/** What is written for a window that has no scores: one of each kind, and KGE. */
const usualScores: readonly StatedName[] = ['nse', 'pbias', 'r2', 'kge'];

/**
 * Scores that are not what the files give, those of windows that have none, and of streamflow those that tell of a regime which
 * the purpose needs. Scores in a table, and of a fragment that stands for many records, are left alone: the manifest has no place
 * for them.
 */
export function scoreFigures(facts: Pick<Facts, 'manifest' | 'records' | 'scores'>): readonly Figure[] {
  const { manifest, records, scores } = facts;
  const flows = flowTargets(facts);
  const unscored = unscoredRegimes(facts);
  return [...scores].flatMap(([name, figures]) => {
    const record = records.nodes.get(`evaluation.${name}`) as RecordNode<'evaluation'>;
    if (record.fragment.scores?.table !== undefined || record.field.at(-1) !== name) return [];
    return scoredWindows.flatMap((window) => {
      const isEmpty = !figures.stated.some((score) => score.window === window);
      const regimes = !flows.includes(record) ? [] : isEmpty ? neededRegimes(manifest) : unscored;
      const needed = regimes
        .filter((regime) => !isScored(regime, window, figures.stated))
        .map((regime) => scoresOfRegime[regime][0]);
      return figuresOver(window, [...(isEmpty ? usualScores : []), ...needed], figures, record);
    });
  });
}

/** Why no score of a window can be computed, in words; null where it can. */
export function whyUnscored({ recomputed }: TargetFigures, window: ScoredWindow): string | null {
  const found = recomputedScore(recomputed, window, 'nse');
  return isDefined(found) ? null : found.undefined;
}

/** Targets without any score, of which none can be computed either, and why: by record id. */
export function unscorable({ scores }: Pick<Facts, 'scores'>): ReadonlyMap<string, string> {
  const found = new Map<string, string>();
  for (const figures of scores.values()) {
    const reasons = scoredWindows.flatMap((window) => whyUnscored(figures, window) ?? []);
    const [why] = reasons;
    if (why !== undefined && figures.stated.length === 0 && reasons.length === scoredWindows.length)
      found.set(figures.record, why);
  }
  return found;
}

function figuresOver(
  window: ScoredWindow,
  missing: readonly StatedName[],
  { stated, recomputed }: TargetFigures,
  { id, field }: RecordNode,
): readonly Figure[] {
  const wrong = stated.filter((score) => score.window === window && !score.agrees);
  const added = missing.map((score) => ({ score, printed: null }));
  return [...wrong, ...added].flatMap(({ score, printed }) => {
    const found = recomputedScore(recomputed, window, score);
    if (!isDefined(found)) return [];
    // One decimal would make an NSE of 0.97 perfect.
    const fewest = Math.abs(found.value) < 2 ? usualDecimals : 0;
    const decimals = Math.min(100, Math.max(fewest, printed?.decimals ?? usualDecimals));
    return {
      record: id,
      field: [...field, 'scores', window, score],
      stated: printed?.value ?? null,
      found: Number(found.value.toFixed(decimals)),
      decimals,
    };
  });
}
