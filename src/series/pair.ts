import { defined, type Paired, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import { secondsOfDay, type Window } from './calendar.ts';
import { calendarYears, type YearBegins } from './hydrological-year.ts';
import { type Series, withoutRepeats } from './series.ts';
import { afterSteps, formatStep, type Step, sameStep, startOfStep, stepsBetween } from './step.ts';
import { countStarts, spansOf, startsIn } from './windows.ts';

export interface Pairing {
  readonly observed: Series;
  readonly simulated: Series;
  /** Whole days, both ends included. A step longer than a day belongs to a window that holds all of it. */
  readonly windows: readonly Window[];
  /** Days that are kept out even where a window holds them, such as the warm-up. */
  readonly leftOut?: readonly Window[];
  /** What a yearly value stands for; calendar years unless stated. */
  readonly yearBegins?: YearBegins;
}

/**
 * Pairs observed with simulated values of the same step. A step at which either is missing or absent is dropped and counted.
 * Irregular observations, such as grab samples, are paired with the simulated step that holds them, and the window then has as
 * many steps as there are observations; several in one step leave it without a value.
 * Undefined: the two series have different regular steps.
 */
export function pairByDate(pairing: Pairing): Statistic<Paired> {
  const { simulated, windows, leftOut = [], yearBegins = calendarYears } = pairing;
  const sampled = pairing.observed.step.kind === 'irregular';
  if (!sampled && !sameStep(pairing.observed.step, simulated.step))
    return undefinedBecause(
      `the observed series has the step ${formatStep(pairing.observed.step)}, the simulated one ${formatStep(simulated.step)}; bring them to one step first`,
    );
  const observed = sampled ? onStepsOf(simulated, pairing.observed) : pairing.observed;
  const { step } = simulated;
  const spans = spansOf(windows, leftOut).map((days) => startsIn(days, step, yearBegins));
  const most = Math.min(observed.values.length, simulated.values.length);
  const pairs = {
    observed: new Float64Array(most),
    simulated: new Float64Array(most),
    times: new Float64Array(most),
  };
  let count = 0;
  let seen = 0;
  const dropped = { missingObserved: 0, missingSimulated: 0, outsideWindow: 0 };
  let spanAt = 0;
  let { fromSeconds, untilSeconds } = spans[spanAt] ?? never;
  let o = 0;
  let s = 0;
  while (o < observed.values.length || (s < simulated.values.length && !sampled)) {
    const observedTime = o < observed.values.length ? (observed.timeSeconds[o] as number) : endOfTime;
    const simulatedTime = s < simulated.values.length ? (simulated.timeSeconds[s] as number) : endOfTime;
    const time = Math.min(observedTime, simulatedTime);
    const observedValue = observedTime === time ? (observed.values[o++] as number) : Number.NaN;
    const simulatedValue = simulatedTime === time ? (simulated.values[s++] as number) : Number.NaN;
    if (sampled && observedTime !== time) continue;
    while (time >= untilSeconds) ({ fromSeconds, untilSeconds } = spans[++spanAt] ?? never);
    if (time < fromSeconds) {
      dropped.outsideWindow++;
      continue;
    }
    seen++;
    const hasObserved = Number.isFinite(observedValue);
    const hasSimulated = Number.isFinite(simulatedValue);
    if (hasObserved && hasSimulated) {
      pairs.observed[count] = observedValue;
      pairs.simulated[count] = simulatedValue;
      pairs.times[count] = time / secondsOfDay;
      count++;
    } else if (hasSimulated) dropped.missingObserved++;
    else if (hasObserved) dropped.missingSimulated++;
  }
  const origin = observed.timeSeconds[0] ?? simulated.timeSeconds[0] ?? 0;
  const onGrid = spans.reduce((steps, span) => steps + countStarts(span, origin, step), 0);
  // Rows off the grid are steps too, though the grid does not foresee them.
  const windowSteps = sampled ? seen : Math.max(onGrid, seen);
  return defined({
    observed: pairs.observed.slice(0, count),
    simulated: pairs.simulated.slice(0, count),
    times: pairs.times.slice(0, count),
    dropped: {
      ...dropped,
      missingBoth: windowSteps - count - dropped.missingObserved - dropped.missingSimulated,
    },
    windowSteps,
  });
}

const endOfTime = Number.POSITIVE_INFINITY;

/** A window after the last one. */
const never = { fromSeconds: endOfTime, untilSeconds: endOfTime };

/** Samples moved to the start of the simulated step that holds them. */
function onStepsOf(simulated: Series, samples: Series): Series {
  const { step } = simulated;
  const origin = simulated.timeSeconds[0] ?? 0;
  const timeSeconds = samples.timeSeconds.map((time) => startOnGrid(time, origin, step));
  return withoutRepeats({ ...samples, step, timeSeconds });
}

function startOnGrid(time: number, origin: number, step: Step): number {
  if (step.kind === 'irregular') return time;
  return afterSteps(origin, Math.floor(stepsBetween(origin, startOfStep(time, step), step)), step);
}
