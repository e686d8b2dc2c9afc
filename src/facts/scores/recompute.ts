import { createHash } from 'node:crypto';
import { isDefined, type Statistic } from '../../hydrology/paired.ts';
import { pairByDate } from '../../series/pair.ts';
import { formatStep } from '../../series/step.ts';
import { comparable, type Sides } from './comparable.ts';
import { daysOf, type Pairable } from './pairings.ts';
import type { ScoredWindow } from './stated.ts';
import { type Asked, type WindowFigures, windowFigures } from './window-figures.ts';

/** What two series give. */
export interface RecomputedFigures {
  /** ISO 8601 duration, or `irregular`. */
  readonly step: string;
  /** Of both series: that of the observations. */
  readonly unit: string;
  /** SHA-256 of both series as a graph shows them, over all their days. */
  readonly graph: string;
  readonly windows: Readonly<Partial<Record<ScoredWindow, Statistic<WindowFigures>>>>;
}

/** The figures that are asked for, of the windows that are stated. Undefined where the series can't be brought together. */
export function recompute(pairable: Pairable, asked: Asked): Statistic<RecomputedFigures> {
  const { comparison, windows } = pairable;
  const brought = comparable(pairable.sides, comparison);
  if (!isDefined(brought)) return brought;
  const { observed, simulated } = brought.value;
  const leftOut = daysOf(windows, 'warm-up');
  const figuresOver = (window: ScoredWindow): Partial<Record<ScoredWindow, Statistic<WindowFigures>>> => {
    const stated = windows.filter(({ kind }) => kind === window);
    if (stated.length === 0) return {};
    const { yearBegins } = comparison;
    const paired = pairByDate({ observed, simulated, windows: daysOf(windows, window), leftOut, yearBegins });
    if (!isDefined(paired)) return { [window]: paired };
    const periods = stated.map(({ period: { first, last } }) => `${first}/${last}`);
    return { [window]: { value: windowFigures(paired.value, periods, simulated.step, asked) } };
  };
  return {
    value: {
      step: formatStep(simulated.step),
      unit: observed.unit,
      graph: digestOf(brought.value),
      windows: { ...figuresOver('calibration'), ...figuresOver('validation') },
    },
  };
}

function digestOf({ observed, simulated }: Sides): string {
  const hash = createHash('sha256');
  for (const array of [observed.timeSeconds, observed.values, simulated.timeSeconds, simulated.values])
    hash.update(`${array.length} `).update(array);
  return hash.digest('hex');
}
