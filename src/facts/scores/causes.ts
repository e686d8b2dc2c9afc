import { errorSampleDeviationRatio } from '../../hydrology/fit/error-sample-deviation-ratio.ts';
import { isDefined, type Paired, type Statistic } from '../../hydrology/paired.ts';
import { type ScoreName, scores } from '../../hydrology/scores.ts';
import { agreesAsPrinted } from '../../hydrology/stated/printed-number.ts';
import { secondsOfDay } from '../../series/calendar.ts';
import type { Series } from '../../series/series.ts';
import { daily, monthly, type Step, sameStep, yearly } from '../../series/step.ts';
import type { Sides } from './comparable.ts';
import { daysOf, type Pairable, pairedOver, pairsOf, simulatedDays } from './pairings.ts';
import type { ScoredWindow, StatedScore } from './stated.ts';

/** Raised whenever the same scores may be explained otherwise. */
export const causesVersion = 1;

/** Why a stated score may be another than the recomputed one. Each was tried and gives the stated figure. */
export type Cause =
  | { readonly is: 'sign-reversed' | 'sample-deviation' | 'swapped-sides' | 'warm-up-inside' }
  | { readonly is: 'whole-simulation' | 'both-windows' | 'incomplete-counted' }
  | { readonly is: 'other-score'; readonly score: ScoreName }
  | { readonly is: 'other-window'; readonly window: ScoredWindow }
  | { readonly is: 'other-step'; readonly step: 'daily' | 'monthly' | 'annual' }
  /** The simulated series so many days later. */
  | { readonly is: 'other-day'; readonly days: 1 | -1 }
  /** Both sides taken to be in this unit, whatever the simulated one is said to be in. */
  | { readonly is: 'one-unit'; readonly unit: string };

/** Whether a figure is the stated one within its printed decimals. */
export function fits({ printed }: StatedScore, recomputed: Statistic): boolean {
  return isDefined(recomputed) && agreesAsPrinted({ stated: printed, recomputed: recomputed.value });
}

/**
 * By stated score of one window that differs from the recomputed one: the mix-ups that give just the stated figure. Where other
 * pairs explain every stated score of the window (two at least), only those; else slips with the single score; else pairs that
 * explain every score that differs.
 */
export function likelyCauses(
  pairable: Pairable,
  window: ScoredWindow,
  stated: readonly StatedScore[],
  differing: readonly StatedScore[],
): ReadonlyMap<StatedScore, readonly Cause[]> {
  const paired = pairsOf(pairable, window);
  const others = otherPairings(pairable, window).flatMap(({ cause, pairs }) => {
    const made = pairs();
    return isDefined(made) ? [{ cause, pairs: made.value }] : [];
  });
  const explaining = (some: readonly StatedScore[]) =>
    others
      .filter(({ pairs }) => some.every((score) => fits(score, scoreOf(score, pairs))))
      .map(({ cause }) => cause);
  const ofAll = stated.length > 1 ? explaining(stated) : [];
  if (ofAll.length > 0) return new Map(differing.map((score) => [score, ofAll]));
  const ofDiffering = explaining(differing);
  return new Map(
    differing.map((score) => {
      const slips = isDefined(paired) ? slipsOf(score, paired.value) : [];
      return [score, slips.length > 0 ? slips : ofDiffering];
    }),
  );
}

function scoreOf({ score }: StatedScore, pairs: Paired): Statistic {
  return score === 'peaks_hit' ? { undefined: 'peaks need settings' } : scores[score](pairs);
}

const signed: ReadonlySet<string> = new Set(['pbias', 'fhv', 'fms', 'flv']);

/** Statistics that are written under another's name. */
const mistaken: Partial<Record<StatedScore['score'], readonly ScoreName[]>> = {
  nse: ['r2'],
  r2: ['nse', 'r'],
  r: ['r2'],
  kge: ['kge_2012'],
  kge_2012: ['kge'],
};

function slipsOf(stated: StatedScore, paired: Paired): readonly Cause[] {
  const causes: Cause[] = [];
  const value = scoreOf(stated, paired);
  if (signed.has(stated.score) && isDefined(value) && fits(stated, { value: -value.value }))
    causes.push({ is: 'sign-reversed' });
  for (const score of mistaken[stated.score] ?? [])
    if (fits(stated, scores[score](paired))) causes.push({ is: 'other-score', score });
  if (stated.score === 'rsr' && fits(stated, errorSampleDeviationRatio(paired)))
    causes.push({ is: 'sample-deviation' });
  return causes;
}

interface Try {
  readonly cause: Cause;
  readonly pairs: () => Statistic<Paired>;
}

/** The same series over other days, in another step, or the other way round. */
function otherPairings(pairable: Pairable, window: ScoredWindow): readonly Try[] {
  const { windows, comparison, sides } = pairable;
  const other: ScoredWindow = window === 'calibration' ? 'validation' : 'calibration';
  const [own, others, warmUp] = [daysOf(windows, window), daysOf(windows, other), daysOf(windows, 'warm-up')];
  const inStep = (step: Step) => pairsOf({ ...pairable, comparison: { ...comparison, step } }, window);
  return [
    ...(others.length > 0
      ? [
          { cause: { is: 'other-window', window: other } as const, pairs: () => pairsOf(pairable, other) },
          {
            cause: { is: 'both-windows' } as const,
            pairs: () => pairedOver(pairable, [...own, ...others], warmUp),
          },
        ]
      : []),
    ...(warmUp.length > 0
      ? [
          {
            cause: { is: 'warm-up-inside' } as const,
            pairs: () => pairedOver(pairable, [...own, ...warmUp], []),
          },
        ]
      : []),
    {
      cause: { is: 'whole-simulation' },
      pairs: () => pairedOver(pairable, simulatedDays(sides), []),
    },
    ...(
      [
        ['daily', daily],
        ['monthly', monthly],
        ['annual', yearly],
      ] as const
    )
      .filter(([, step]) => comparison.step === null || !sameStep(step, comparison.step))
      .map(([name, step]) => ({
        cause: { is: 'other-step', step: name } as const,
        pairs: () => inStep(step),
      })),
    {
      cause: { is: 'incomplete-counted' },
      pairs: () => pairsOf({ ...pairable, comparison: { ...comparison, incomplete: true } }, window),
    },
    {
      cause: { is: 'swapped-sides' },
      pairs: () => {
        const paired = pairsOf(pairable, window);
        return isDefined(paired)
          ? { value: { ...paired.value, observed: paired.value.simulated, simulated: paired.value.observed } }
          : paired;
      },
    },
    ...otherSimulations(sides).map(({ cause, simulated }) => ({
      cause,
      pairs: () => pairsOf({ ...pairable, sides: { ...sides, simulated } }, window),
    })),
  ];
}

/** The simulated series dated a day off, or in another unit than is said. */
function otherSimulations({ observed, simulated }: Sides): readonly { cause: Cause; simulated: Series }[] {
  const moved = (days: 1 | -1) => ({
    cause: { is: 'other-day', days } as const,
    simulated: {
      ...simulated,
      timeSeconds: simulated.timeSeconds.map((seconds) => seconds + days * secondsOfDay),
    },
  });
  const { unit } = observed;
  return [
    ...(sameStep(observed.step, daily) && sameStep(simulated.step, daily) ? [moved(-1), moved(1)] : []),
    ...(unit === simulated.unit
      ? []
      : [{ cause: { is: 'one-unit', unit } as const, simulated: { ...simulated, unit } }]),
  ];
}
