import { afterSteps, type Step, stepsBetween } from './step.ts';
import { type Gap, type Listed, listedAtMost, type TimeAt } from './table.ts';

/** A list that grows to `listedAtMost` and counts on. */
export class Listing<T> implements Listed<T> {
  total = 0;
  readonly first: T[] = [];

  /** `weight` is what `total` counts, where one entry stands for several. */
  add(entry: T, weight = 1): void {
    this.total += weight;
    if (this.first.length < listedAtMost) this.first.push(entry);
  }
}

export interface StepFaults {
  readonly repeated: Listed<TimeAt>;
  readonly offStep: Listed<TimeAt>;
  readonly absent: Listed<Gap>;
}

/** Where rows in rising order of time break the step: the same time again, off the grid that the first row sets, steps that no row holds. */
export function stepFaults(timeSeconds: Float64Array, lines: Uint32Array, step: Step | null): StepFaults {
  const repeated = new Listing<TimeAt>();
  const offStep = new Listing<TimeAt>();
  const absent = new Listing<Gap>();
  const first = timeSeconds[0] ?? 0;
  const regular = step !== null && step.kind !== 'irregular';
  let reached = 0;
  for (let row = 1; row < timeSeconds.length; row++) {
    const time = timeSeconds[row] as number;
    const passed = time - (timeSeconds[row - 1] as number);
    if (step?.kind === 'seconds' && passed === step.length) {
      reached++;
      continue;
    }
    const at = { line: lines[row] as number, timeSeconds: time };
    if (passed === 0) repeated.add(at);
    else if (regular) {
      const steps = stepsBetween(first, time, step);
      const whole = Math.floor(steps);
      if (whole !== steps) offStep.add(at);
      const between = whole - reached - 1;
      if (between > 0)
        absent.add(
          {
            firstSeconds: afterSteps(first, reached + 1, step),
            lastSeconds: afterSteps(first, whole - 1, step),
            steps: between,
          },
          between,
        );
      reached = whole;
    }
  }
  return { repeated, offStep, absent };
}
