import { type Dimension, dimensionless, dimensionOf } from './unit.ts';

export interface KnownUnit {
  readonly factor: number;
  readonly offset?: number;
  readonly dimension: Dimension;
}

const length = dimensionOf({ length: 1 });
const area = dimensionOf({ length: 2 });
const volume = dimensionOf({ length: 3 });
const flow = dimensionOf({ length: 3, time: -1 });
const mass = dimensionOf({ mass: 1 });
const time = dimensionOf({ time: 1 });
const temperature = dimensionOf({ temperature: 1 });
const month = dimensionOf({ month: 1 });
const pressure = dimensionOf({ length: -1, mass: 1, time: -2 });
const energy = dimensionOf({ length: 2, mass: 1, time: -2 });

/** Of the US survey foot, 1200/3937 m, as UDUNITS has it; 4 millionths larger than that of the international foot. */
const acre: KnownUnit = { factor: 43_560 * (1200 / 3937) ** 2, dimension: area };
const cubicFootPerSecond: KnownUnit = { factor: 0.3048 ** 3, dimension: flow };
const none: KnownUnit = { factor: 1, dimension: dimensionless };

/** Symbols, in exactly these capitals. Factors as in the database of UDUNITS 2.2.28. */
export const symbols: ReadonlyMap<string, KnownUnit> = new Map<string, KnownUnit>([
  ['m', { factor: 1, dimension: length }],
  ['g', { factor: 1e-3, dimension: mass }],
  ['t', { factor: 1e3, dimension: mass }],
  ['lb', { factor: 0.45359237, dimension: mass }],
  ['s', { factor: 1, dimension: time }],
  ['min', { factor: 60, dimension: time }],
  ['h', { factor: 3600, dimension: time }],
  ['hr', { factor: 3600, dimension: time }],
  ['d', { factor: 86_400, dimension: time }],
  ['yr', { factor: 12, dimension: month }],
  ['K', { factor: 1, dimension: temperature }],
  ['degK', { factor: 1, dimension: temperature }],
  ['degC', { factor: 1, offset: 273.15, dimension: temperature }],
  ['°C', { factor: 1, offset: 273.15, dimension: temperature }],
  ['degF', { factor: 5 / 9, offset: 459.67 * (5 / 9), dimension: temperature }],
  ['°F', { factor: 5 / 9, offset: 459.67 * (5 / 9), dimension: temperature }],
  ['A', { factor: 1, dimension: dimensionOf({ current: 1 }) }],
  ['mol', { factor: 1, dimension: dimensionOf({ amount: 1 }) }],
  ['cd', { factor: 1, dimension: dimensionOf({ light: 1 }) }],
  ['rad', none],
  ['°', { factor: Math.PI / 180, dimension: dimensionless }],
  ['%', { factor: 0.01, dimension: dimensionless }],
  ['ppm', { factor: 1e-6, dimension: dimensionless }],
  ['ppb', { factor: 1e-9, dimension: dimensionless }],
  ['in', { factor: 0.0254, dimension: length }],
  ['ft', { factor: 0.3048, dimension: length }],
  ['yd', { factor: 0.9144, dimension: length }],
  ['mi', { factor: 1609.344, dimension: length }],
  ['ha', { factor: 1e4, dimension: area }],
  ['l', { factor: 1e-3, dimension: volume }],
  ['L', { factor: 1e-3, dimension: volume }],
  ['N', { factor: 1, dimension: dimensionOf({ length: 1, mass: 1, time: -2 }) }],
  ['Pa', { factor: 1, dimension: pressure }],
  ['bar', { factor: 1e5, dimension: pressure }],
  ['atm', { factor: 101_325, dimension: pressure }],
  ['J', { factor: 1, dimension: energy }],
  ['cal', { factor: 4.1868, dimension: energy }],
  ['W', { factor: 1, dimension: dimensionOf({ length: 2, mass: 1, time: -3 }) }],
  ['S', { factor: 1, dimension: dimensionOf({ length: -2, mass: -1, time: 3, current: 2 }) }],
]);

/** Names, in small or capital letters, with or without a plural s. The second group is the trade's own; UDUNITS has not got it. */
export const names: ReadonlyMap<string, KnownUnit> = new Map<string, KnownUnit>([
  ...['metre', 'meter'].map((name) => [name, { factor: 1, dimension: length }] as const),
  ...['gram', 'gramme'].map((name) => [name, { factor: 1e-3, dimension: mass }] as const),
  ['tonne', { factor: 1e3, dimension: mass }],
  ...['second', 'sec'].map((name) => [name, { factor: 1, dimension: time }] as const),
  ['minute', { factor: 60, dimension: time }],
  ['hour', { factor: 3600, dimension: time }],
  ['day', { factor: 86_400, dimension: time }],
  ['week', { factor: 604_800, dimension: time }],
  ['month', { factor: 1, dimension: month }],
  ['year', { factor: 12, dimension: month }],
  ['kelvin', { factor: 1, dimension: temperature }],
  ...['celsius', 'degree_celsius', 'degrees_celsius', 'degreec', 'deg_c'].map(
    (name) => [name, { factor: 1, offset: 273.15, dimension: temperature }] as const,
  ),
  ['fahrenheit', { factor: 5 / 9, offset: 459.67 * (5 / 9), dimension: temperature }],
  ['radian', none],
  ['degree', { factor: Math.PI / 180, dimension: dimensionless }],
  ['percent', { factor: 0.01, dimension: dimensionless }],
  ...['inch', 'inches'].map((name) => [name, { factor: 0.0254, dimension: length }] as const),
  ...['foot', 'feet'].map((name) => [name, { factor: 0.3048, dimension: length }] as const),
  ['yard', { factor: 0.9144, dimension: length }],
  ['mile', { factor: 1609.344, dimension: length }],
  ['acre', acre],
  ['hectare', { factor: 1e4, dimension: area }],
  ...['litre', 'liter'].map((name) => [name, { factor: 1e-3, dimension: volume }] as const),
  ['pascal', { factor: 1, dimension: pressure }],
  ['joule', { factor: 1, dimension: energy }],
  ['watt', { factor: 1, dimension: dimensionOf({ length: 2, mass: 1, time: -3 }) }],

  ['cumec', { factor: 1, dimension: flow }],
  ['cusec', cubicFootPerSecond],
  ['cfs', cubicFootPerSecond],
  ['mld', { factor: 1e3 / 86_400, dimension: flow }],
  ['mcm', { factor: 1e6, dimension: volume }],
  ['ac', acre],
  ['mins', { factor: 60, dimension: time }],
  ...['dimensionless', 'unitless', 'fraction', 'psu'].map((name) => [name, none] as const),
]);

/** Texts that mean one thing to UDUNITS and another to many who write them. */
export const ambiguous: ReadonlyMap<string, string> = new Map([
  ['a', 'it is an are (100 m2) in UDUNITS and a year elsewhere: write `year`, or `ha` for an area'],
  [
    'Mm',
    'it is a megametre (1000 km) in UDUNITS: write `mm`, or `1e6 m3` or `hm3` for a million cubic metres',
  ],
  ['C', 'it is the coulomb in UDUNITS: write `degC`'],
  ['ton', 'it is the short ton of 907 kg in UDUNITS: write `t` or `tonne` for 1000 kg'],
  ['gal', 'it is a unit of acceleration in UDUNITS, and gallons differ by country: write litres or `m3`'],
  ['gallon', 'gallons differ by country: write litres or `m3`'],
]);

export const prefixSymbols: ReadonlyMap<string, number> = new Map([
  ...(
    [
      ['Y', 24],
      ['Z', 21],
      ['E', 18],
      ['P', 15],
      ['T', 12],
      ['G', 9],
      ['M', 6],
      ['k', 3],
      ['h', 2],
      ['da', 1],
      ['d', -1],
      ['c', -2],
      ['m', -3],
      ['u', -6],
      ['n', -9],
      ['p', -12],
      ['f', -15],
    ] as const
  ).map(([prefix, power]) => [prefix, Number(`1e${power}`)] as const),
]);

export const prefixNames: ReadonlyMap<string, number> = new Map([
  ['giga', 1e9],
  ['mega', 1e6],
  ['kilo', 1e3],
  ['hecto', 1e2],
  ['deca', 1e1],
  ['deci', 1e-1],
  ['centi', 1e-2],
  ['milli', 1e-3],
  ['micro', 1e-6],
  ['nano', 1e-9],
]);
