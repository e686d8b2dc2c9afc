import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { isDefined } from '../../src/hydrology/paired.ts';
import { conversion } from '../../src/series/units/conversion.ts';
import { parseUnit } from '../../src/series/units/parse-unit.ts';
import { unitUnfitFor } from '../../src/series/units/role.ts';
import { outside } from '../harness/outside.ts';

/** Units that UDUNITS reads too, and what to give them in. */
const shared: readonly (readonly [string, string])[] = [
  ['mm d-1', 'm s-1'],
  ['mm/d', 'm/s'],
  ['mm/day', 'in/hr'],
  ['mm per day', 'mm/h'],
  ['mm.d-1', 'm s-1'],
  ['mm*d-1', 'm s-1'],
  ['millimetre/hour', 'mm/d'],
  ['m3 s-1', 'l/s'],
  ['m^3/s', 'ML d-1'],
  ['m**3 s**-1', 'ft3/s'],
  ['m3/s/km2', 'l s-1 km-2'],
  ['hm3', '1e6 m3'],
  ['ML', '1000 m3'],
  ['hm3', 'm3'],
  ['acre-foot', 'm3'],
  ['acre ft', 'm3'],
  ['acre', 'ha'],
  ['mi', 'km'],
  ['yd', 'm'],
  ['km2', 'hectare'],
  ['degC', 'K'],
  ['celsius', 'degF'],
  ['degree_Celsius', 'fahrenheit'],
  ['degF', 'degC'],
  ['degC d-1', 'K/d'],
  ['mg/L', 'kg m-3'],
  ['ug/l', 'mg/l'],
  ['kg ha-1 d-1', 'g m-2 d-1'],
  ['t km-2', 'kg/ha'],
  ['lb', 'kg'],
  ['mmol/L', 'mol m-3'],
  ['MJ m-2 d-1', 'W m-2'],
  ['cal cm-2', 'MJ/m2'],
  ['W/(m2 K)', 'W m-2 K-1'],
  ['W/m2/K', 'W m-2 K-1'],
  ['hPa', 'mbar'],
  ['kPa', 'atm'],
  ['N m-2', 'Pa'],
  ['uS/cm', 'S m-1'],
  ['%', '1'],
  ['percent', 'ppm'],
  ['ppb', 'ppm'],
  ['m2 m-2', '1'],
  ['degree', 'rad'],
  ['week', 'd'],
  ['Days', 'hours'],
  ['min', 's'],
  ['dd', 'h'],
];

/** What UDUNITS refuses, and we too. */
const refused = ['rain', 'mm/', '(mm', 'm 2x', 'mo', 'NTU', 'mm//d', 'mm d-', 'm^', 'm3 s-1)'];

/** Pairs that measure different things, to both. */
const unlike: readonly (readonly [string, string])[] = [
  ['kg m-2 s-1', 'mm s-1'],
  ['m3 s-1', 'mm d-1'],
  ['degC', 'mm'],
  ['mm', 'mm/d'],
  ['mg/L', 'kg/d'],
];

const udunits = outside('udunits2', ['-H', 'm', '-W', 'km']);

describe.skipIf(!udunits.available)(`against UDUNITS ${udunits.reason}`, () => {
  for (const [from, to] of shared)
    it(`${from} in ${to}`, () => {
      const ours = conversion({ from, to });
      if (!isDefined(ours)) throw new Error(ours.undefined);
      const { factor, offset } = ours.value;
      const theirs = theirConversion(from, to);
      // The program prints six digits.
      expect(Math.abs(factor / theirs.factor - 1)).toBeLessThan(5.1e-6);
      expect(Math.abs(offset - theirs.offset)).toBeLessThan(5.1e-6 * Math.abs(theirs.offset) + 1e-12);
    });

  for (const text of refused)
    it(`${text} is no unit`, () => {
      expect(ask(text, '1').problem).not.toBe('');
      expect(isDefined(parseUnit(text))).toBe(false);
    });

  for (const [from, to] of unlike)
    it(`${from} can't be given in ${to}`, () => {
      expect(ask(from, to).problem).toContain('not convertible');
      expect(isDefined(conversion({ from, to }))).toBe(false);
    });
});

/** Both streams: its exit status is 0 even where it refuses. */
function ask(from: string, to: string): { readonly answer: string; readonly problem: string } {
  const { stdout, stderr } = spawnSync('udunits2', ['-H', from, '-W', to], { encoding: 'utf8', input: '' });
  return { answer: stdout, problem: stderr };
}

/** From its second line: `x/km = 0.001*(x/m)`, `x/K = (x/degC) + 273.15` or `x/degF = 1.8*(x/degC) + 32`. */
function theirConversion(from: string, to: string): { readonly factor: number; readonly offset: number } {
  const { answer, problem } = ask(from, to);
  const parts = /= (?:([\d.e+-]+)\*)?\(x\/.*?\)(?: ([+-]) ([\d.e+-]+))?\s*$/.exec(answer);
  if (problem !== '' || parts === null) throw new Error(`${from} in ${to}: ${answer}${problem}`);
  const sign = parts[2] === '-' ? -1 : 1;
  return { factor: Number(parts[1] ?? 1), offset: sign * Number(parts[3] ?? 0) };
}

describe('the manner of the trade, which UDUNITS does not read', () => {
  // Definitions: 1 cumec = 1 m3/s, 1 ft = 0.3048 m (international foot, 1959), 1 ML = 1000 m3.
  it.each([
    ['m³ s⁻¹', 'm3 s-1', 1],
    ['m³·s⁻¹', 'm3 s-1', 1],
    ['cumec', 'm3/s', 1],
    ['cumecs', 'm3/s', 1],
    ['cfs', 'm3/s', 0.3048 ** 3],
    ['cusecs', 'ft3/s', 1],
    ['MLD', 'm3/d', 1000],
    ['MCM', 'm3', 1e6],
    ['10^6 m3', 'm3', 1e6],
    ['mg l⁻¹', 'g/m3', 1],
    ['µg/L', 'mg/m3', 1],
    ['psu', '1', 1],
    ['dimensionless', '1', 1],
    ['mins', 's', 60],
    ['ac', 'acre', 1],
    ['mm/yr', 'mm/month', 1 / 12],
    ['kg/ha/year', 'kg ha-1 month-1', 1 / 12],
  ])('%s is %s times %d', (from, to, factor) => {
    const found = conversion({ from, to });
    if (!isDefined(found)) throw new Error(found.undefined);
    expect(found.value.factor / factor).toBeCloseTo(1, 12);
    expect(found.value.offset).toBe(0);
  });

  it('keeps the freezing point in tenths of a degree and in two words', () => {
    // 0 degC = 273.15 K by definition (SI brochure, 9th edition, 2.3.1).
    expect(conversion({ from: '0.1 degC', to: 'K' })).toEqual({ value: { factor: 0.1, offset: 273.15 } });
    expect(conversion({ from: 'degrees C', to: 'K' })).toEqual({ value: { factor: 1, offset: 273.15 } });
  });

  it.each([
    ['a', 'an are (100 m2)'],
    ['mm a-1', 'an are (100 m2)'],
    ['Mm3', 'a megametre (1000 km)'],
    ['Mm/d', 'a megametre (1000 km)'],
    ['C', 'the coulomb'],
    ['tons/d', 'the short ton'],
    ['gallons', 'gallons differ'],
  ])('asks what is meant by %s', (text, reason) => {
    expect(parseUnit(text)).toMatchObject({ undefined: expect.stringContaining(reason) });
  });

  it.each([
    ['', 'no unit is stated'],
    ['m 2', 'can\'t be read as a unit from "2" on'],
    ['10-3 m', 'can\'t be read as a unit from "-3 m" on'],
    ['mm/', 'ends where a unit should follow'],
    ['MM/d', '"MM" is no unit'],
    ['m99', 'has a power of 99'],
    ['(mm', 'opens a bracket that it does not close'],
  ])('refuses "%s"', (text, reason) => {
    expect(parseUnit(text)).toMatchObject({ undefined: expect.stringContaining(reason) });
  });

  it.each([
    ['mm/month', 'mm/d', 'no fixed length'],
    ['kg m-2 s-1', 'mm/s', 'without its density'],
    ['m3/s', 'mm/s', 'an area is needed'],
    ['degC', 'm', 'different things'],
  ])('says why %s is not given in %s', (from, to, reason) => {
    expect(conversion({ from, to })).toMatchObject({ undefined: expect.stringContaining(reason) });
  });
});

describe('units and roles', () => {
  const fits = (role: string, unit: string) => unitUnfitFor(role, unit) === null;

  it.each([
    ['precipitation', ['mm', 'mm/d', 'mm/month', 'in', 'kg m-2 s-1'], ['m3/s', 'degC', 'mm2', '1']],
    ['evapotranspiration', ['mm d-1', 'mm'], ['W m-2']],
    ['streamflow', ['m3/s', 'cumecs', 'ML/d', 'mm/d', 'm3', 'mm'], ['mm2/s', 'kg/s', 'm2']],
    ['temperature', ['degC', 'K', '0.1 degC', 'degF'], ['mm', '1']],
    ['water_quality', ['mg/L', 'kg/d', 't/yr', 'kg ha-1', 'uS/cm', '1'], ['m', 'mg N/L']],
    ['sediment', ['t/d', 'g m-3'], ['m3/s']],
    ['groundwater', ['m', 'mm/d', 'm3/d'], ['kg']],
    ['groundwater_level', ['m', 'ft'], ['m3/d']],
    ['soil_water', ['mm', '%', 'm3 m-3'], ['mm/d']],
    ['leaf_area', ['1', 'm2 m-2'], ['m2']],
    ['terrain', ['m'], ['degC']],
    ['other', ['W m-2', '1'], ['nonsense']],
  ])('%s', (role, good, bad) => {
    expect(good.filter((unit) => !fits(role, unit))).toEqual([]);
    expect(bad.filter((unit) => fits(role, unit))).toEqual([]);
  });

  it('says what is called for', () => {
    expect(unitUnfitFor('precipitation', 'm3/s')).toBe(
      '"m3/s" does not measure a depth of water for each step (mm) or in a time (mm/d)',
    );
  });
});
