// The two-store model: a daily water balance of a catchment with a soil store in each elevation zone and one
// groundwater store, a snow cover, a channel store and one reservoir. All water is in millimetres over the
// catchment. Run it with:
//
//   node model/two-store.mjs --control model/control.txt --out runs/calibrated
import { mkdirSync, realpathSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { readKeys, readTable, round, writeTable } from './table.mjs';

const version = '1.4';
const release = '1.4.2';

/** Fluxes of the day, then stores at its end; all in mm over the catchment. */
const fluxes = ['rain', 'pet', 'et', 'recharge', 'base_flow', 'flow', 'supply'];
const stores = ['snow', 'soil', 'channel', 'groundwater', 'reservoir'];
const columns = [...fluxes, ...stores];

/** Reads all that a control file names. Paths are taken from the current folder. */
export function readSetup(controlPath) {
  const control = readKeys(controlPath);
  const within = ({ date }) => date >= control.first_day && date <= control.last_day;
  const days = readTable(control.rain).filter(within);
  const areaKm2 = Number(control.area_km2);
  const setup = {
    control,
    areaKm2,
    degreeDayFactor: Number(control.degree_day_factor_mm),
    dates: days.map(({ date }) => date),
    months: days.map(({ date }) => Number(date.slice(5, 7)) - 1),
    rain: days.map(({ rain_mm }) => Number(rain_mm)),
    zones: readTable(control.zones).map((zone) => ({
      share: Number(zone.share),
      rainFactor: Number(zone.rain_factor),
      elevation: Number(zone.elevation_m),
    })),
    reservoir: readReservoir(control, areaKm2),
  };
  const stationTemperature = readTable(control.temperature)
    .filter(within)
    .map(({ t_mean }) => Number(t_mean));
  const colderBy = (elevation) =>
    ((elevation - Number(control.station_elevation_m)) / 100) * Number(control.lapse_rate_degC);
  for (const zone of setup.zones)
    zone.temperature = stationTemperature.map((value) => value - colderBy(zone.elevation));
  const meanElevation = setup.zones.reduce((sum, zone) => sum + zone.share * zone.elevation, 0);
  const temperature = stationTemperature.map((value) => value - colderBy(meanElevation));
  setup.leafArea = leafArea(temperature);
  setup.evapotranspiration = temperature.map(
    (value, day) =>
      potentialEvapotranspiration(value, setup.dates[day], Number(control.latitude_deg)) *
      (0.8 + 0.14 * setup.leafArea[day]),
  );
  return setup;
}

/** Parameter values by name, from a table with the columns `name` and `value`. */
export function readParameters(path) {
  return Object.fromEntries(readTable(path).map(({ name, value }) => [name, Number(value)]));
}

/**
 * Simulates all days of the set-up. Every flux is rounded (to 0.001 mm in a zone, to 0.0001 mm for the
 * catchment), so that the columns as printed balance exactly: rain = evapotranspiration + flow + supply +
 * change of snow, soil, channel, groundwater and reservoir. Stores are those at the end of the day.
 */
export function simulate(setup, parameters) {
  const { zones, reservoir } = setup;
  const capacity = parameters.soil_capacity;
  const channelShare = 1 - Math.exp(-1 / parameters.quick_recession);
  const zone = zones.map(() => ({ snow: 0, soil: capacity / 2 }));
  let groundwater = 50;
  let channel = 0;
  let stored = reservoir.capacity;
  const out = Object.fromEntries(columns.map((name) => [name, new Float64Array(setup.dates.length)]));

  for (let day = 0; day < setup.dates.length; day += 1) {
    const pet = round(setup.evapotranspiration[day] * parameters.evaporation_factor, 3);
    out.pet[day] = pet;
    for (let place = 0; place < zones.length; place += 1) {
      const { share, rainFactor, temperature } = zones[place];
      const state = zone[place];
      const rain = round(setup.rain[day] * rainFactor, 3);
      const warmth = temperature[day] - parameters.snow_threshold;
      const melt = warmth > 0 ? Math.min(state.snow, round(setup.degreeDayFactor * warmth, 3)) : 0;
      const snowfall = warmth > 0 ? 0 : rain;
      state.snow += snowfall - melt;

      // Saturation excess: the wetter the soil, the larger the share of its area that sheds water at once.
      const water = rain - snowfall + melt;
      const wet = Math.min(1, state.soil / capacity);
      let quick = water === 0 ? 0 : round(water * wet ** parameters.runoff_shape, 3);
      quick += Math.max(0, state.soil + water - quick - capacity);
      state.soil += water - quick;

      const et = Math.min(state.soil, round(pet * Math.min(1, state.soil / (0.5 * capacity)), 3));
      state.soil -= et;
      const percolation = round((state.soil * state.soil) / (capacity * parameters.percolation_days), 3);
      state.soil -= percolation;

      out.rain[day] += share * rain;
      out.et[day] += share * et;
      out.snow[day] += share * state.snow;
      out.soil[day] += share * state.soil;
      channel += share * quick;
      out.recharge[day] += share * percolation;
    }
    const quickFlow = round(channel * channelShare, 4);
    channel -= quickFlow;
    groundwater += out.recharge[day];
    const baseFlow = round(groundwater / parameters.groundwater_recession, 4);
    groundwater -= baseFlow;

    const inflow = round((quickFlow + baseFlow) * reservoir.share, 4);
    const month = setup.months[day];
    stored += inflow;
    const supply = Math.min(stored, reservoir.supply[month]);
    const compensation = Math.min(stored - supply, reservoir.release[month]);
    const spill = Math.max(0, stored - supply - compensation - reservoir.capacity);
    stored -= supply + compensation + spill;

    out.base_flow[day] = baseFlow;
    out.flow[day] = quickFlow + baseFlow - inflow + compensation + spill;
    out.supply[day] = supply;
    out.channel[day] = channel;
    out.groundwater[day] = groundwater;
    out.reservoir[day] = stored;
  }
  return out;
}

/** m3/s from mm over the catchment in a day. */
export function toM3s(flowMm, areaKm2) {
  return round((flowMm * areaKm2) / 86.4, 3);
}

/** The reservoir's share of the catchment, capacity and monthly releases, in mm over the catchment. */
function readReservoir(control, areaKm2) {
  const months = readTable(control.reservoir);
  const toMm = (m3s) => round((Number(m3s) * 86.4) / areaKm2, 4);
  return {
    share: Number(control.reservoir_share),
    capacity: Number(control.reservoir_capacity_mm),
    release: months.map(({ release_m3s }) => toMm(release_m3s)),
    supply: months.map(({ supply_m3s }) => toMm(supply_m3s)),
  };
}

/** mm/d from the day's mean temperature (degC) and the sun's height (Oudin et al. 2005, J. Hydrol. 303:290-306). */
function potentialEvapotranspiration(temperature, date, latitudeDeg) {
  const dayOfYear = (Date.parse(date) - Date.parse(`${date.slice(0, 4)}-01-01`)) / 86_400_000 + 1;
  const angle = (2 * Math.PI * dayOfYear) / 365;
  const latitude = (latitudeDeg * Math.PI) / 180;
  const declination = 0.409 * Math.sin(angle - 1.39);
  const sunset = Math.acos(-Math.tan(latitude) * Math.tan(declination));
  const radiation =
    37.6 *
    (1 + 0.033 * Math.cos(angle)) *
    (sunset * Math.sin(latitude) * Math.sin(declination) +
      Math.cos(latitude) * Math.cos(declination) * Math.sin(sunset));
  return Math.max(0, (radiation / 2.45) * ((temperature + 5) / 100));
}

/** Leaf area per ground area: follows warmth above 4 degC with a delay of three weeks, from 0.8 to 4.3. */
function leafArea(temperature) {
  let leaf = 0.5;
  return temperature.map((value) => {
    leaf += (Math.min(1, Math.max(0, (value - 4) / 10)) - leaf) / 21;
    return 0.8 + 3.5 * leaf;
  });
}

function monthlyMeans(dates, values) {
  const months = new Map();
  dates.forEach((date, day) => {
    const of = months.get(date.slice(0, 7)) ?? { sum: 0, days: 0 };
    months.set(date.slice(0, 7), { sum: of.sum + values[day], days: of.days + 1 });
  });
  return {
    month: [...months.keys()],
    lai: [...months.values()].map(({ sum, days }) => round(sum / days, 2)),
  };
}

function run(controlPath, folder) {
  const setup = readSetup(controlPath);
  const parameters = readParameters(setup.control.parameters);
  const result = simulate(setup, parameters);
  const daily = { date: setup.dates };
  for (const name of columns) daily[`${name}_mm`] = Array.from(result[name], (value) => round(value, 4));
  daily.flow_m3s = Array.from(result.flow, (value) => toM3s(value, setup.areaKm2));
  mkdirSync(folder, { recursive: true });
  const { only } = setup.control;
  writeTable(
    join(folder, 'daily.csv'),
    only === undefined ? daily : { date: daily.date, [only]: daily[only] },
  );
  writeTable(join(folder, 'monthly.csv'), monthlyMeans(setup.dates, setup.leafArea));
  const log = [
    `two-store release ${release}`,
    `version ${version}`,
    `control ${controlPath}`,
    `days ${setup.dates.length} from ${setup.dates[0]} to ${setup.dates.at(-1)}`,
    `warm-up ${setup.control.warmup_years} years`,
    ...Object.entries(parameters).map(([name, value]) => `parameter ${name} ${value}`),
  ];
  writeFileSync(join(folder, 'run.log'), `${log.join('\n')}\n`);
}

if (process.argv[1] !== undefined && realpathSync(process.argv[1]) === import.meta.filename) {
  const { values } = parseArgs({ options: { control: { type: 'string' }, out: { type: 'string' } } });
  run(values.control, values.out);
}
