import { dateOf, monthNumber, secondsOfDay } from '../series/calendar.ts';
import type { Series } from '../series/series.ts';
import { type Step, startOfStep } from '../series/step.ts';

/** A series whose step nobody states, in the step that its times have; as it is where they have none. */
export function withStep(series: Series): Series {
  if (series.step.kind !== 'irregular') return series;
  const step = stepFound(series.timeSeconds);
  if (step === null) return series;
  return { ...series, step, timeSeconds: series.timeSeconds.map((time) => startOfStep(time, step)) };
}

/** The step of which all distances between times are whole multiples, if it occurs more often than not; null where there is none. */
function stepFound(times: Float64Array): Step | null {
  return multipleOf(monthsOf(times), 'months') ?? multipleOf(times, 'seconds');
}

/** Times as months, where each stands on the same day of its month, a month or more apart; else none. */
function monthsOf(times: Float64Array): ArrayLike<number> {
  const days = times.map((time) => Math.floor(time / secondsOfDay));
  const [first] = days;
  const apart = (day: number, place: number) => place === 0 || day - (days[place - 1] ?? 0) >= 28;
  if (first === undefined || !days.every(apart)) return [];
  const { day: onDay } = dateOf(first);
  return days.every((day) => dateOf(day).day === onDay) ? days.map(monthNumber) : [];
}

function multipleOf(places: ArrayLike<number>, kind: 'months' | 'seconds'): Step | null {
  const distances = Array.from(
    { length: Math.max(0, places.length - 1) },
    (_, index) => (places[index + 1] ?? 0) - (places[index] ?? 0),
  );
  const length = distances.reduce((least, distance) => Math.min(least, distance), Number.POSITIVE_INFINITY);
  if (!Number.isInteger(length) || distances.some((distance) => distance % length !== 0)) return null;
  const often = distances.filter((distance) => distance === length).length;
  return 2 * often > distances.length ? { kind, length } : null;
}
