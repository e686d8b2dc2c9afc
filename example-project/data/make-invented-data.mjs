// Invents the weather, the terrain and the leaf area of a catchment that does not exist, and hands the true
// rain and temperature to make-invented-flow.mjs. Everything comes from seeded chance: run it again and get
// the same files.
import { mkdirSync, writeFileSync } from 'node:fs';
import { seededRandom } from '../calibration/random.mjs';
import { round, writeTable } from '../model/table.mjs';

export const dates = Array.from({ length: 5113 }, (_, day) =>
  new Date(Date.UTC(2001, 9, 1 + day)).toISOString().slice(0, 10),
);
const month = dates.map((date) => Number(date.slice(5, 7)));
/** The year in which the hydrological year ends. */
const waterYear = dates.map((date, day) => Number(date.slice(0, 4)) + (month[day] >= 10 ? 1 : 0));

/** How wet the story makes each hydrological year from 2002: a drought in 2006, floods in 2008. */
const wetness = [1.02, 0.94, 0.98, 1.1, 0.77, 1.04, 1.25, 0.9, 1.08, 0.86, 1.12, 1, 1.07, 0.93];

/** Places that measure rain: share of the catchment's rain, and when and for how many days the gauge failed. */
const gauges = {
  'fennock-bridge': { factor: 0.72, failed: { '2006-12-19': 3, '2012-07-03': 31 } },
  'sallow-rigg': { factor: 1, failed: { '2002-02-11': 26, '2007-08-14': 45 } },
  'high-tarrow': { factor: 1.28, failed: { '2001-12-27': 38, '2007-01-05': 19, '2011-12-02': 37 } },
};

/** Rain over the catchment (mm/d) and mean temperature at the station (degC), as they truly were. */
export function trueWeather() {
  const { uniform, normal } = seededRandom(20011001);
  let wet = false;
  let departure = 0;
  const rain = [];
  const temperature = [];
  dates.forEach((_date, day) => {
    const wetYear = wetness[waterYear[day] - 2002];
    const season = Math.cos((2 * Math.PI * (day + 273 - 15)) / 365.25); // 1 in mid January, -1 in mid July
    const chance = (0.5 + 0.06 * season) * (0.6 + 0.4 * wetYear);
    wet = uniform() < (wet ? chance + 0.2 : chance - 0.2);
    const depth = (4.6 + 0.8 * season) * (0.4 + 0.6 * wetYear) * (-Math.log(1 - uniform())) ** 1.3;
    rain.push(wet ? Math.min(depth, 68) : 0);
    departure = 0.78 * departure + 1.55 * normal();
    temperature.push(
      8.9 - 5.8 * Math.cos((2 * Math.PI * (day + 273 - 25)) / 365.25) + departure - 2.2 * (wetYear - 1),
    );
  });
  return { rain, temperature };
}

/** What a gauge catches: its place's share, the storm's own pattern, 4 % lost to wind unless it is shielded. */
function gaugeRain(rain, factor, seed, caught = 0.96) {
  const { uniform, normal } = seededRandom(seed);
  return rain.map((depth) => {
    const passedBy = uniform() < 0.03;
    const pattern = Math.max(0.2, 1 + 0.22 * normal());
    return passedBy ? 0 : round(depth * factor * caught * pattern, 1);
  });
}

function withFailures(values, failed, seed) {
  const { uniform } = seededRandom(seed);
  const texts = values.map(String);
  for (const [from, length] of Object.entries(failed)) {
    const first = dates.indexOf(from);
    const code = uniform() < 0.5 ? '' : '-9.9';
    texts.fill(code, first, first + length);
  }
  return texts;
}

/** Monthly leaf area as a satellite composite would give it: a smooth year with noise. */
function leafArea(temperature) {
  const { normal } = seededRandom(69);
  const months = [...new Set(dates.map((date) => date.slice(0, 7)))].filter((name) => name >= '2010-01');
  const lai = months.map((name) => {
    const warm = temperature.filter((_, day) => dates[day].startsWith(name));
    const mean = warm.reduce((sum, value) => sum + value, 0) / warm.length;
    const summer = Math.min(1, Math.max(0, (mean - 3.5) / 11));
    return round(Math.max(0.3, 0.9 + 3.3 * summer ** 1.2 + 0.25 * normal()), 2);
  });
  return { month: months, lai };
}

/** A valley that rises from the outlet in the south-east: 2368 cells of 250 m, 148 km2. */
function terrain() {
  const { normal } = seededRandom(148);
  const [columns, rows, cellKm] = [60, 56, 0.25];
  const cells = [];
  for (let row = 0; row < rows; row += 1) {
    for (let column = 0; column < columns; column += 1) {
      const west = (58 - column) * cellKm;
      const north = (54 - row) * cellKm;
      const along = (west + north) / Math.SQRT2;
      const across = (north - west) / Math.SQRT2 - 0.4 * Math.sin(along / 2);
      const inside = ((along - 9) / 9.6) ** 2 + (across / 5) ** 2;
      const slope = 118 + 17 * along + (6 + 0.7 * along) * across * across * 0.9;
      cells.push({
        inside,
        height: Math.round(slope + 9 * Math.sin(along * 1.7 + across) + 3 * normal() + 9),
      });
    }
  }
  const edge = cells.map(({ inside }) => inside).sort((a, b) => a - b)[2368];
  const texts = cells.map(({ inside, height }) => (inside < edge ? height : -9999));
  const header = [
    'ncols 60',
    'nrows 56',
    'xllcorner 359000',
    'yllcorner 525750',
    'cellsize 250',
    'NODATA_value -9999',
  ];
  const lines = Array.from({ length: rows }, (_, row) =>
    texts.slice(row * columns, (row + 1) * columns).join(' '),
  );
  return `${[...header, ...lines].join('\n')}\n`;
}

export function makeData() {
  for (const folder of ['rain', 'check', 'terrain', 'vegetation'])
    mkdirSync(`data/${folder}`, { recursive: true });
  const { rain, temperature } = trueWeather();
  Object.entries(gauges).forEach(([name, { factor, failed }], place) => {
    const caught = gaugeRain(rain, factor, 101 + place);
    writeTable(`data/rain/${name}.csv`, { date: dates, rain_mm: withFailures(caught, failed, 201 + place) });
  });
  writeTable('data/check/lowfold.csv', { date: dates, rain_mm: gaugeRain(rain, 0.97, 301, 1) });
  writeTable('data/climate.csv', { date: dates, t_mean: temperature.map((value) => round(value, 1)) });
  writeTable('data/vegetation/leaf-area.csv', leafArea(temperature));
  writeFileSync('data/terrain/dem.asc', terrain());
}
