import type { Series } from './series.ts';
import { afterSteps, stepsBetween } from './step.ts';
import type { Gap } from './table.ts';

/**
 * Runs of steps without a value, between the first and the last time of a series: steps that are absent, and rows that are missing.
 * In an irregular series only rows can be missing.
 */
export function gapsOf(series: Series): readonly Gap[] {
  const { timeSeconds, values, step } = series;
  const first = timeSeconds[0] ?? 0;
  const gaps: Gap[] = [];
  /** Steps from the first time to the last that has a value. */
  let reached = -1;
  for (let row = 0; row < timeSeconds.length; row++) {
    const last = row === timeSeconds.length - 1;
    const hasValue = !Number.isNaN(values[row]);
    if (!hasValue && !last) continue;
    const at =
      step.kind === 'irregular' ? row : Math.floor(stepsBetween(first, timeSeconds[row] as number, step));
    const until = hasValue ? at : at + 1;
    const steps = until - reached - 1;
    if (steps > 0) {
      const timeOf = (place: number) =>
        step.kind === 'irregular' ? (timeSeconds[place] as number) : afterSteps(first, place, step);
      gaps.push({ firstSeconds: timeOf(reached + 1), lastSeconds: timeOf(until - 1), steps });
    }
    reached = at;
  }
  return gaps;
}
