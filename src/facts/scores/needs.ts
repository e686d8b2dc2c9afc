import type { Manifest } from '../../manifest/manifest.ts';
import type { RecordNode } from '../../records/record.ts';
import type { Facts } from '../facts.ts';
import { nodesIn } from '../nodes-in.ts';
import type { TargetFigures } from '../scores.ts';
import type { ScoredWindow, StatedName } from './stated.ts';

/** Regimes of streamflow that ask for scores of their own, and the scores that answer; the first is the usual one. */
export const scoresOfRegime = {
  low: ['log_nse', 'flv'],
  high: ['peaks_hit'],
} as const satisfies Readonly<Record<string, readonly [StatedName, ...StatedName[]]>>;
export type Regime = keyof typeof scoresOfRegime;

/** The regimes of streamflow that the purpose needs and that ask for scores of their own. */
export function neededRegimes({ data }: Manifest): readonly Regime[] {
  const regimes = (data.study?.needs ?? [])
    .filter(({ variable = 'streamflow' }) => variable === 'streamflow')
    .flatMap(({ regime }) => (regime === 'low' || regime === 'high' ? [regime] : []));
  return [...new Set(regimes)];
}

/** Those of them for which no target has a score in each of its windows that have scores; none while no target has any. */
export function unscoredRegimes(facts: Pick<Facts, 'manifest' | 'records' | 'scores'>): readonly Regime[] {
  const targets = flowTargets(facts)
    .map((target) => scoresOfTarget(target, facts))
    .filter((stated) => stated.length > 0);
  if (targets.length === 0) return [];
  return neededRegimes(facts.manifest).filter(
    (regime) => !targets.some((stated) => stated.every(({ window }) => isScored(regime, window, stated))),
  );
}

/** What is stated of a target. */
export function scoresOfTarget(
  { name }: RecordNode<'evaluation'>,
  { scores }: Pick<Facts, 'scores'>,
): TargetFigures['stated'] {
  return scores.get(name ?? '')?.stated ?? [];
}

/** The targets that evaluate streamflow. */
export function flowTargets({ records }: Pick<Facts, 'records'>): readonly RecordNode<'evaluation'>[] {
  return nodesIn(records.nodes, 'evaluation').filter(
    ({ fragment }) => fragment.variable === 'streamflow' && fragment.none_because === undefined,
  );
}

/** Whether a window has a score that tells of a regime. */
export function isScored(regime: Regime, window: ScoredWindow, stated: TargetFigures['stated']): boolean {
  const answers: readonly StatedName[] = scoresOfRegime[regime];
  return stated.some((one) => one.window === window && answers.includes(one.score));
}
