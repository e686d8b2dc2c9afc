import type { StatedParameter } from '../../facts/parameters/stated.ts';

/** How many numbers calibration was free to choose: one factor or shift for many layers and units is one. */
export function calibratedCount(values: readonly StatedParameter[]): number {
  const free = values
    .filter(({ parameter }) => parameter.calibrated !== false && parameter.change !== undefined)
    .map(({ parameter: { name, change, by }, label }) =>
      change === 'set' || by === undefined ? label : `${name} ${change} ${by}`,
    );
  return new Set(free).size;
}
