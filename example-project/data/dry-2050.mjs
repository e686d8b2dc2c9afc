// Makes the dry 2050 storyline: the years 2001 to 2015 moved forward by forty years (leap days fall on leap
// days), each month's rain multiplied and its temperature raised.
import { mkdirSync } from 'node:fs';
import { readTable, round, writeTable } from '../model/table.mjs';

/** January to December. */
const rainFactor = [0.94, 0.92, 0.88, 0.84, 0.78, 0.7, 0.64, 0.62, 0.7, 0.82, 0.9, 0.94];
const warmerBy = [0.5, 0.5, 0.5, 0.5, 0.6, 0.6, 0.7, 0.7, 0.7, 0.6, 0.5, 0.5];

function change(from, column, to, changed) {
  const days = readTable(from);
  writeTable(to, {
    date: days.map(({ date }) => `${Number(date.slice(0, 4)) + 40}${date.slice(4)}`),
    [column]: days.map((day) => changed(Number(day[column]), Number(day.date.slice(5, 7)) - 1)),
  });
}

export function makeScenario() {
  mkdirSync('data/scenarios', { recursive: true });
  const rain = (value, month) => round(value * rainFactor[month], 2);
  change('data/prepared/catchment-rain.csv', 'rain_mm', 'data/scenarios/dry-2050.csv', rain);
  const temperature = (value, month) => round(value + warmerBy[month], 1);
  change('data/climate.csv', 't_mean', 'data/scenarios/dry-2050-temperature.csv', temperature);
}
