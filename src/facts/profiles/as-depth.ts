import { isDefined, type Statistic } from '../../hydrology/paired.ts';
import { convertSeries, type Over } from '../../series/convert-series.ts';
import type { Series } from '../../series/series.ts';
import { afterSteps, type Step } from '../../series/step.ts';

/**
 * A series of water as a depth in mm for each step; a kilogram of water on a square metre is a millimetre.
 * Undefined: a unit that gives none, a flow without the area.
 */
export function asDepth(series: Series, over: Over = {}): Statistic<Series> {
  const depth = convertSeries(series, 'mm', over);
  if (isDefined(depth)) return depth;
  const mass = convertSeries(series, 'kg m-2', over);
  return isDefined(mass) ? mass : depth;
}

const secondsOfYear = 365.2425 * 86_400;

/** The depth in mm that a mean value makes in a year of mean length; null for an irregular step, or a unit that gives none. */
export function annualDepthMm(
  of: { readonly mean: number; readonly unit: string; readonly step: Step | null },
  over: Over = {},
): number | null {
  const { mean, unit, step } = of;
  if (step === null || step.kind === 'irregular') return null;
  // Months differ in length, so that a whole year of them is added up.
  const steps = step.kind === 'months' && step.length < 12 ? Math.round(12 / step.length) : 1;
  const times = Float64Array.from({ length: steps }, (_, place) => afterSteps(0, place, step));
  const depth = asDepth({ unit, step, timeSeconds: times, values: times.map(() => mean) }, over);
  if (!isDefined(depth)) return null;
  const sum = depth.value.values.reduce((one, other) => one + other, 0);
  const end = afterSteps(0, steps, step);
  return (sum * secondsOfYear) / end;
}
