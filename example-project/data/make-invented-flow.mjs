// Invents what the gauge at Old Mill would have measured. It is not the two-store model: interception, two
// kinds of soil, two aquifers, travel time, people at the reservoir, storms that no rain gauge saw, and a
// rating curve with its own errors.
import { mkdirSync } from 'node:fs';
import { seededRandom } from '../calibration/random.mjs';
import { round, writeTable } from '../model/table.mjs';
import { dates, trueWeather } from './make-invented-data.mjs';

/** Summer storms over the catchment that fell between the rain gauges (mm). */
export const unseen = { '2012-06-28': 34, '2012-08-05': 41 };

/** Days taken out of the record: weed on the stage, and a logger that stopped. */
const removed = { '2007-07-10': 23, '2012-01-17': 9 };

const soils = [
  { share: 0.6, capacity: 120, shape: 1.6 },
  { share: 0.4, capacity: 260, shape: 3.2 },
];

/** Pastures are watered from June to August. */
function irrigationMm(month) {
  return month >= 6 && month <= 8 ? 0.001 : 0;
}

function trueFlowMm({ rain, temperature }) {
  const { uniform, normal } = seededRandom(8677);
  const state = soils.map(({ capacity }) => ({ water: capacity * 0.6 }));
  let [snow, quick, upper, lower, reservoir] = [0, 0, 12, 60, 3.5];
  let yesterday = 0;
  return dates.map((date, day) => {
    const month = Number(date.slice(5, 7));
    const areal = (rain[day] + (unseen[date] ?? 0)) * Math.max(0.2, 1 + 0.47 * normal());
    const cold = temperature[day] - 1;
    const snowShare = Math.min(1, Math.max(0, (0.8 - cold) / 2.5));
    const melt = Math.min(snow, 2.6 * Math.max(0, cold - 0.3));
    snow += areal * snowShare - melt;
    const intercepted = Math.min(areal * (1 - snowShare), month >= 5 && month <= 10 ? 1.1 : 0.5);
    const water = areal * (1 - snowShare) - intercepted + melt;
    const season = Math.max(0, Math.cos((2 * Math.PI * (day + 273 - 195)) / 365.25) + 0.55) / 1.55;
    const thirst = Math.max(
      0,
      (0.25 + 3.5 * season) * (1 + 0.04 * (temperature[day] - 9)) - 0.5 * intercepted,
    );
    soils.forEach(({ share, capacity, shape }, place) => {
      const soil = state[place];
      const shed = water * (soil.water / capacity) ** shape;
      soil.water += water - shed;
      const spill = Math.max(0, soil.water - capacity);
      soil.water -= spill;
      soil.water -= Math.min(soil.water, thirst * (1 - Math.exp((-3.2 * soil.water) / capacity)));
      const drained = soil.water > 0.3 * capacity ? 0.016 * (soil.water - 0.3 * capacity) : 0;
      soil.water -= drained;
      quick += share * (shed + spill) * 0.82;
      upper += share * (shed + spill) * 0.18 + share * drained * 0.4;
      lower += share * drained * 0.6;
    });
    const fast = quick * Math.min(0.75, 0.36 + 0.012 * quick);
    quick -= fast;
    const middle = upper / 19;
    upper -= middle;
    const slow = lower / 120;
    lower -= slow;
    const runoff = 0.7 * (fast + middle) + 0.3 * yesterday + slow;
    yesterday = fast + middle;
    reservoir += 0.13 * runoff;
    const taken = Math.min(reservoir, (month >= 5 && month <= 9 ? 0.036 : 0.03) * (0.9 + 0.2 * uniform()));
    const released = Math.min(reservoir - taken, 0.025 + 0.015 * uniform());
    const spilled = Math.max(0, reservoir - taken - released - 6);
    reservoir -= taken + released + spilled;
    return Math.max(0.05, 0.87 * runoff + released + spilled - irrigationMm(month));
  });
}

export function makeFlow() {
  for (const folder of ['flow', 'management']) mkdirSync(`data/${folder}`, { recursive: true });
  const { normal } = seededRandom(31);
  let error = 0;
  const flow = trueFlowMm(trueWeather()).map((mm, day) => {
    error = 0.93 * error + 0.37 * normal(); // standard deviation near 1, remembered for about two weeks
    const month = Number(dates[day].slice(5, 7));
    const ratingError = month >= 6 && month <= 9 ? 0.13 : 0.08; // weed in the channel makes summers worse
    return String(round((mm * 148 * (1 + ratingError * error)) / 86.4, 3));
  });
  for (const [from, length] of Object.entries(removed)) {
    const first = dates.indexOf(from);
    flow.fill('NA', first, first + length);
  }
  writeTable('data/flow/old-mill.csv', { date: dates, flow_m3s: flow });
  const months = [...new Set(dates.map((date) => date.slice(0, 7)))];
  const taken = months.map((name) => round((irrigationMm(Number(name.slice(5))) * 148) / 86.4, 4));
  writeTable('data/management/irrigation.csv', { month: months, taken_m3s: taken });
}
