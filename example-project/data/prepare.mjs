// Prepares what the model reads: catchment rain without gaps and corrected for undercatch,
// and elevation zones from the terrain.
import { mkdirSync, readFileSync } from 'node:fs';
import { readTable, round, writeTable } from '../model/table.mjs';

const undercatch = 1.04; // unshielded gauges lose 4 % to wind
const gauges = ['fennock-bridge', 'sallow-rigg', 'high-tarrow'];
/** The next gauges to fill from, nearest first. */
const neighbours = [
  [1, 2],
  [0, 2],
  [1, 0],
];

/** Rain in mm/d; a missing value is null. */
function readGauge(name) {
  return readTable(`data/rain/${name}.csv`).map(({ rain_mm }) =>
    ['', '-9.9'].includes(rain_mm) ? null : Number(rain_mm),
  );
}

/** Ratio of two gauges' totals over the days that both have. */
function ratio(one, other) {
  const both = one.map((_, day) => day).filter((day) => one[day] !== null && other[day] !== null);
  const total = (series) => both.reduce((sum, day) => sum + series[day], 0);
  return total(one) / total(other);
}

function fill(series, place) {
  return series[place].map((value, day) => {
    if (value !== null) return value;
    const from = neighbours[place].find((other) => series[other][day] !== null);
    return series[from][day] * ratio(series[place], series[from]);
  });
}

/** Catchment rain: mean of the filled gauges, corrected for undercatch. */
function catchmentRain() {
  const series = gauges.map(readGauge);
  const filled = series.map((_, place) => fill(series, place));
  return filled[0].map((_, day) => {
    const mean = filled.reduce((sum, values) => sum + values[day], 0) / filled.length;
    return round(mean * undercatch, 2);
  });
}

/** Three zones that hold the lowest 30 %, the middle 40 % and the highest 30 % of the catchment. */
function zones() {
  const lines = readFileSync('data/terrain/dem.asc', 'utf8').trim().split('\n').slice(6);
  const heights = lines.flatMap((line) => line.split(' ').map(Number)).filter((height) => height !== -9999);
  heights.sort((a, b) => a - b);
  const share = [0.3, 0.4, 0.3];
  const ends = [0, 0.3, 0.7, 1].map((part) => Math.round(part * heights.length));
  const elevation = share.map((_, zone) => {
    const inside = heights.slice(ends[zone], ends[zone + 1]);
    return Math.round(inside.reduce((sum, height) => sum + height, 0) / inside.length);
  });
  return { zone: ['low', 'middle', 'high'], share, elevation_m: elevation, rain_factor: [0.7, 1, 1.3] };
}

export function prepare() {
  mkdirSync('data/prepared', { recursive: true });
  const dates = readTable(`data/rain/${gauges[0]}.csv`).map(({ date }) => date);
  writeTable('data/prepared/catchment-rain.csv', { date: dates, rain_mm: catchmentRain() });
  writeTable('data/prepared/zones.csv', zones());
}
