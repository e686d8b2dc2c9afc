import { defined, isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import type { Series } from './series.ts';
import { afterSteps } from './step.ts';
import { scaling, unlike } from './units/conversion.ts';
import { parseUnit } from './units/parse-unit.ts';
import type { Unit } from './units/unit.ts';

/** What a conversion may need besides the two units. */
export interface Over {
  /** To go between a flow (m3/s) and a depth (mm/d). */
  readonly areaKm2?: number;
}

/**
 * A series in another unit. Between a rate (mm/d, m3/s) and an amount for each step (mm, m3) the step of the series counts; between
 * a volume and a depth the area. So m3/s over an area becomes mm/d, or mm for each day.
 * Undefined: units that can't be read or measure different things; no area or no step where one is needed.
 */
export function convertSeries(series: Series, to: string, over: Over = {}): Statistic<Series> {
  const from = parseUnit(series.unit);
  if (!isDefined(from)) return from;
  const target = parseUnit(to);
  if (!isDefined(target)) return target;
  const plan = bridge(from.value, target.value, series, over);
  if (!isDefined(plan)) return plan;
  const { secondsPower } = plan.value;
  const { factor, offset } = scaling(from.value, target.value);
  const scale = factor * plan.value.factor;
  const values = series.values.map((value, row) => {
    if (secondsPower === 0) return value * scale + offset;
    const time = series.timeSeconds[row] as number;
    return value * scale * (afterSteps(time, 1, series.step) - time) ** secondsPower;
  });
  return defined({ ...series, unit: to, values });
}

/** What bridges two units of different dimension: a factor, and a power of the length of each step in seconds. */
function bridge(
  from: Unit,
  to: Unit,
  series: Series,
  over: Over,
): Statistic<{ readonly factor: number; readonly secondsPower: number }> {
  const gap = from.dimension.map((power, base) => power - (to.dimension[base] ?? 0));
  const [length = 0, mass = 0, time = 0, temperature = 0, current = 0, amount = 0, light = 0, month = 0] =
    gap;
  const others = [mass, temperature, current, amount, light].some((power) => power !== 0);
  if (others || (length !== 0 && Math.abs(length) !== 2) || Math.abs(time) > 1 || Math.abs(month) > 1)
    return unlike(from, to);
  const { areaKm2 } = over;
  if (length !== 0 && areaKm2 === undefined) return unlike(from, to);
  if (areaKm2 !== undefined && !(areaKm2 > 0)) return undefinedBecause('the area is not above zero');
  const { step } = series;
  if (time !== 0 && step.kind === 'irregular')
    return undefinedBecause(
      `${from.text} can't be given in ${to.text}: an irregular series has no step to count with`,
    );
  if (month !== 0 && step.kind !== 'months') return unlike(from, to);
  const area = length === 0 ? 1 : ((areaKm2 ?? 1) * 1e6) ** (-length / 2);
  const months = step.kind === 'months' ? step.length ** -month : 1;
  return defined({ factor: area * months, secondsPower: -time });
}
