import { isDefined } from '../../hydrology/paired.ts';
import { parseUnit } from './parse-unit.ts';
import { type Dimension, dimensionless, dimensionOf, sameDimension } from './unit.ts';

/** What a unit must measure, in words and as dimensions; months count as time. */
interface Measure {
  readonly words: string;
  readonly dimensions: readonly Dimension[];
}

const depth = dimensionOf({ length: 1 });
const depthRate = dimensionOf({ length: 1, time: -1 });
const waterMass = dimensionOf({ mass: 1, length: -2 });
const waterMassRate = dimensionOf({ mass: 1, length: -2, time: -1 });
const volume = dimensionOf({ length: 3 });
const flow = dimensionOf({ length: 3, time: -1 });
const mass = dimensionOf({ mass: 1 });
const massRate = dimensionOf({ mass: 1, time: -1 });
const concentration = dimensionOf({ mass: 1, length: -3 });
const molarConcentration = dimensionOf({ amount: 1, length: -3 });
const temperature = dimensionOf({ temperature: 1 });
const conductivity = dimensionOf({ length: -3, mass: -1, time: 3, current: 2 });

const water: Measure = {
  words: 'a depth of water for each step (mm) or in a time (mm/d)',
  dimensions: [depth, depthRate, waterMass, waterMassRate],
};
const load: Measure = {
  words: 'a concentration (mg/L), a load (kg/d, kg/ha/d) or a share',
  dimensions: [
    concentration,
    molarConcentration,
    mass,
    massRate,
    waterMass,
    waterMassRate,
    dimensionless,
    temperature,
    conductivity,
  ],
};

/** By the role of an input or the variable of an evaluation; those not listed may have any unit. */
const measures: Readonly<Record<string, Measure>> = {
  precipitation: water,
  evapotranspiration: water,
  temperature: { words: 'a temperature (degC)', dimensions: [temperature] },
  streamflow: {
    words: 'a volume in a time (m3/s), or a depth over the catchment (mm/d, mm)',
    dimensions: [flow, volume, depthRate, depth],
  },
  water_quality: load,
  sediment: load,
  nitrogen: load,
  phosphorus: load,
  terrain: { words: 'a height (m)', dimensions: [depth] },
  groundwater: { words: 'a level (m) or a flow (m3/d, mm/d)', dimensions: [depth, depthRate, flow, volume] },
  groundwater_level: { words: 'a level (m)', dimensions: [depth] },
  soil_water: { words: 'a depth of water (mm) or a share of the soil', dimensions: [depth, dimensionless] },
  leaf_area: { words: 'an area over an area (1)', dimensions: [dimensionless] },
};

/** Whether a unit can be read and measures what the role of an input, or the variable of an evaluation, calls for: null, or the reason why not. */
export function unitUnfitFor(role: string, unit: string): string | null {
  const parsed = parseUnit(unit);
  if (!isDefined(parsed)) return parsed.undefined;
  const measure = measures[role];
  if (measure === undefined) return null;
  const [length, mass, time, temperature, current, amount, light, month] = parsed.value.dimension;
  const dimension: Dimension = [length, mass, time + month, temperature, current, amount, light, 0];
  if (measure.dimensions.some((fitting) => sameDimension(fitting, dimension))) return null;
  return `"${unit}" does not measure ${measure.words}`;
}
