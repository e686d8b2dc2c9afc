import { dayNumber, formatDate, parseDate } from '../../src/series/calendar.ts';

/**
 * The files that sound.yaml names, by path. Every figure is invented: a shower every fourth day (in the dry scenario somewhat
 * less, and less from year to year), a temperature that follows the season, and two stores that drain. The flow "observed" is that
 * of the model with other constants, so that it is not the model.
 */
export function soundFiles(): Record<string, string> {
  const now = simulate('2001-10-01', '2010-09-30', { factor: 1, more: 0 }, 70);
  const gauge = simulate('2001-10-01', '2010-09-30', { factor: 1.04, more: 0 }, 64);
  const dry = simulate('2041-10-01', '2050-09-30', { factor: 0.5, more: 5.5 }, 70);
  return {
    'data/rain.csv': table('date,rain_mm', now, ({ rain }) => [rain]),
    'data/check.csv': table('date,rain_mm', now, ({ rain }) => [rain * 0.97]),
    'data/temperature.csv': table('date,t_mean', now, ({ temperature }) => [temperature]),
    'data/flow.csv': table('date,flow_m3s', gauge, ({ flow, place }) => [
      place === 900 || place === 901 ? 'NA' : toFlow(flow),
    ]),
    'data/leaf-area.csv': `month,lai\n${months(2007, 36).join('')}`,
    'data/dry-rain.csv': table('date,rain_mm', dry, ({ rain }) => [rain]),
    'data/dem.asc':
      'ncols 3\nnrows 2\nxllcorner 400000\nyllcorner 300000\ncellsize 50\nNODATA_value -9999\n120 118 115\n117 112 108\n',
    'data/prepare.mjs': '// Invented: multiplies the gauge totals by 1.03.\n',
    'model/model.mjs': '// Invented: two stores, one after the other.\n',
    'model/control.txt': 'begins 2001-10-01\nends 2010-09-30\nwarmup_years 2\n',
    'model/control-dry.txt': 'begins 2041-10-01\nends 2050-09-30\nwarmup_years 2\n',
    'model/parameters.txt':
      'name value\nsoil_capacity 180\nevaporation_factor 0.9\nsnow_threshold 0.9\nquick_recession 4\ngroundwater_recession 70\n',
    'model/pond.txt': 'outflow_m3s 0.02\n',
    'calibration/sensitivity.csv':
      'parameter,change_of_kge\nsoil_capacity,0.11\ngroundwater_recession,0.08\n',
    'runs/calibrated/daily.csv': daily(now),
    'runs/calibrated/monthly.csv': `month,lai\n${months(2001, 108).join('')}`,
    'runs/calibrated/band.csv': table(
      'date,low,high',
      now.filter(({ day }) => day >= (parseDate('2007-10-01') ?? 0)),
      ({ flow }) => [toFlow(flow * 0.8), toFlow(flow * 1.25)],
    ),
    'runs/calibrated/run.log': 'pair-of-stores release 2.1.0\n3287 days simulated\n',
    'runs/dry/daily.csv': daily(dry),
  };
}

interface Day {
  readonly place: number;
  readonly day: number;
  readonly rain: number;
  readonly temperature: number;
  readonly potential: number;
  readonly evapotranspiration: number;
  readonly flow: number;
  readonly soil: number;
  readonly groundwater: number;
}

function simulate(
  first: string,
  last: string,
  showers: { readonly factor: number; readonly more: number },
  recessionDays: number,
): readonly Day[] {
  const [begin = 0, end = 0] = [first, last].map((date) => parseDate(date) ?? 0);
  let [soil, groundwater] = [120, 60];
  return Array.from({ length: end - begin + 1 }, (_, place) => {
    const day = begin + place;
    const year = Number(formatDate(day).slice(0, 4));
    const season = Math.cos((2 * Math.PI * (day - dayNumber(year, 7, 20))) / 365.25);
    const rain =
      place % 4 === 0 ? showers.factor * (5 + ((place * 7) % 11) + ((year * 5) % 4)) + showers.more : 0;
    const temperature = 9 + 7 * season;
    const potential = Math.max(0.2, 1.5 + 1.4 * season);
    const evapotranspiration = Math.min(soil * 0.05, potential);
    const recharge = Math.max(0, soil + rain - evapotranspiration - 150) * 0.5;
    soil += rain - evapotranspiration - recharge;
    const flow = (groundwater + recharge) / recessionDays;
    groundwater += recharge - flow;
    return { place, day, rain, temperature, potential, evapotranspiration, flow, soil, groundwater };
  });
}

/** mm/d over the catchment's 50 km2 as m3/s. */
function toFlow(mm: number): number {
  return (mm * 50_000) / 86_400;
}

function daily(days: readonly Day[]): string {
  return table('date,rain_mm,pet_mm,et_mm,flow_mm,flow_m3s,soil_mm,groundwater_mm', days, (one) => [
    one.rain,
    one.potential,
    one.evapotranspiration,
    one.flow,
    toFlow(one.flow),
    one.soil,
    one.groundwater,
  ]);
}

function table(
  header: string,
  days: readonly Day[],
  values: (day: Day) => readonly (number | string)[],
): string {
  const rows = days.map((one) => {
    const cells = values(one).map((value) => (typeof value === 'number' ? value.toFixed(4) : value));
    return `${formatDate(one.day)},${cells.join(',')}\n`;
  });
  return `${header}\n${rows.join('')}`;
}

/** Leaf area from October of a year on. */
function months(year: number, count: number): readonly string[] {
  return Array.from({ length: count }, (_, place) => {
    const month = (9 + place) % 12;
    const leaves = 2 - 1.5 * Math.cos((2 * Math.PI * (month - 0.5)) / 12);
    return `${year + Math.floor((9 + place) / 12)}-${String(month + 1).padStart(2, '0')},${leaves.toFixed(2)}\n`;
  });
}
