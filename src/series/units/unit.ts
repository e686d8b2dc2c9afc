/**
 * Powers of the base units: metre, kilogram, second, kelvin, ampere, mole, candela, month. A month has no fixed length, so it
 * is a base unit of its own; a year is twelve of them.
 */
export type Dimension = readonly [
  length: number,
  mass: number,
  time: number,
  temperature: number,
  current: number,
  amount: number,
  light: number,
  month: number,
];

/** A unit of measurement: a value v in it is `v x factor + offset` in base units. */
export interface Unit {
  /** As written. */
  readonly text: string;
  readonly factor: number;
  /** Zero but for degC and degF standing alone. */
  readonly offset: number;
  readonly dimension: Dimension;
}

/** Powers by name, those not named being zero. */
export function dimensionOf(powers: {
  readonly length?: number;
  readonly mass?: number;
  readonly time?: number;
  readonly temperature?: number;
  readonly current?: number;
  readonly amount?: number;
  readonly light?: number;
  readonly month?: number;
}): Dimension {
  const {
    length = 0,
    mass = 0,
    time = 0,
    temperature = 0,
    current = 0,
    amount = 0,
    light = 0,
    month = 0,
  } = powers;
  return [length, mass, time, temperature, current, amount, light, month];
}

export const dimensionless = dimensionOf({});

export function sameDimension(one: Dimension, other: Dimension): boolean {
  return one.every((power, base) => power === other[base]);
}

/** The product of two units, the second raised to a whole power. Offsets do not enter products: degC d-1 is K d-1. */
export function times(one: Unit, other: Unit, power: number): Unit {
  const dimension = one.dimension.map((exponent, base) => exponent + power * (other.dimension[base] ?? 0));
  return {
    text: one.text,
    factor: one.factor * other.factor ** power,
    offset: 0,
    dimension: dimension as unknown as Dimension,
  };
}
