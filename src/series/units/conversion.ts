import { defined, isDefined, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import { parseUnit } from './parse-unit.ts';
import { sameDimension, type Unit } from './unit.ts';

/** A value v becomes `v x factor + offset`. */
export interface Conversion {
  readonly factor: number;
  readonly offset: number;
}

/** How values go from one unit to another; undefined where either is no unit or the two measure different things. */
export function conversion(units: { readonly from: string; readonly to: string }): Statistic<Conversion> {
  const from = parseUnit(units.from);
  if (!isDefined(from)) return from;
  const to = parseUnit(units.to);
  if (!isDefined(to)) return to;
  if (!sameDimension(from.value.dimension, to.value.dimension)) return unlike(from.value, to.value);
  return defined(scaling(from.value, to.value));
}

/** The same between units of one dimension, or whose dimensions something else bridges. */
export function scaling(from: Unit, to: Unit): Conversion {
  return { factor: from.factor / to.factor, offset: (from.offset - to.offset) / to.factor };
}

/** Why values in one unit can't be given in the other. */
export function unlike(from: Unit, to: Unit): { readonly undefined: string } {
  const [length = 0, mass = 0, time = 0, , , , , month = 0] = from.dimension.map(
    (power, base) => power - (to.dimension[base] ?? 0),
  );
  let why = 'they measure different things';
  if (month !== 0 && time === -month)
    why = 'a month or year has no fixed length, so only the step of a series tells';
  else if (mass !== 0 && length === -3 * mass) why = 'a mass of water is no depth without its density';
  else if (Math.abs(length) === 2) why = 'an area is needed to go between a volume and a depth';
  return undefinedBecause(`${from.text} can't be given in ${to.text}: ${why}`);
}
