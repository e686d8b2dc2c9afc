// Calibrates the two-store model: random search over the whole ranges, then local refinement around the best.
// Writes model/parameters.txt and how sensitive the objective is to each parameter.
import { writeFileSync } from 'node:fs';
import { readTable, round, writeTable } from '../model/table.mjs';
import { readSetup, simulate, toM3s } from '../model/two-store.mjs';
import { seededRandom } from './random.mjs';
import { objective, pairs } from './scores.mjs';

/** First and last days. The six wettest and the six driest years make the differential split-sample test. */
export const windows = {
  calibration: [['2003-10-01', '2009-09-30']],
  validation: [['2009-10-01', '2015-09-30']],
  wetYears: waterYears(2005, 2007, 2008, 2010, 2012, 2014),
  dryYears: waterYears(2004, 2006, 2009, 2011, 2013, 2015),
};

function waterYears(...years) {
  return years.map((year) => [`${year - 1}-10-01`, `${year}-09-30`]);
}

/** Name, unit, range and the decimals that are kept. */
export const searched = [
  { name: 'soil_capacity', unit: 'mm', range: [50, 400], decimals: 0 },
  { name: 'evaporation_factor', unit: '1', range: [0.7, 1.3], decimals: 2 },
  { name: 'snow_threshold', unit: 'degC', range: [-1, 2], decimals: 1 },
  { name: 'runoff_shape', unit: '1', range: [0.5, 6], decimals: 2 },
  { name: 'percolation_days', unit: 'd', range: [5, 150], decimals: 0 },
  { name: 'quick_recession', unit: 'd', range: [0.5, 8], decimals: 2 },
  { name: 'groundwater_recession', unit: 'd', range: [20, 200], decimals: 0 },
];

/** Observed daily mean flow in m3/s; null where missing. */
export function readObserved() {
  return readTable('data/flow/old-mill.csv').map(({ flow_m3s }) =>
    flow_m3s === 'NA' ? null : Number(flow_m3s),
  );
}

/** Simulated flow in m3/s, as the model prints it. */
export function simulatedFlow(setup, parameters) {
  const { flow } = simulate(setup, parameters);
  return Array.from(flow, (mm) => toM3s(mm, setup.areaKm2));
}

/** A function that gives the objective of a parameter set over the windows. */
export function rater(setup, observed, over) {
  const upTo = { ...setup, dates: setup.dates.filter((date) => date <= over.at(-1)[1]) };
  return (set) => objective(pairs(upTo.dates, observed, simulatedFlow(upTo, set), over));
}

/** The best set that the search finds: random sets over the whole ranges, then steps around the best so far. */
function search(rate, { seed, random, local }) {
  const { uniform, normal } = seededRandom(seed);
  let best = { set: null, score: Number.NEGATIVE_INFINITY };
  const tryOut = (draw) => {
    const set = makeSet(draw);
    const score = rate(set);
    if (score > best.score) best = { set, score };
  };
  for (let count = 0; count < random; count += 1)
    tryOut(({ range: [low, high] }) => low + uniform() * (high - low));
  for (let count = 0; count < local; count += 1) {
    const reach = 0.15 * (1 - count / local) + 0.01;
    const { set } = best;
    tryOut(({ name, range: [low, high] }) =>
      uniform() < 0.4 ? set[name] + normal() * reach * (high - low) : set[name],
    );
  }
  return best;
}

/** A parameter set from a value for each parameter, kept within its range and to its decimals. */
export function makeSet(draw) {
  const within = ({ range, decimals }, value) =>
    round(Math.min(range[1], Math.max(range[0], value)), decimals);
  return Object.fromEntries(searched.map((one) => [one.name, within(one, draw(one))]));
}

/** Change of the objective when one parameter moves by a tenth of its range, down and up. */
function sensitivity(rate, { set, score }) {
  const moved = (part) =>
    searched.map(({ name, range: [low, high] }) => {
      const other = makeSet((one) => set[one.name] + (one.name === name ? part * (high - low) : 0));
      return round(rate(other) - score, 4);
    });
  return {
    parameter: searched.map(({ name }) => name),
    change_when_lower: moved(-0.1),
    change_when_higher: moved(0.1),
  };
}

function writeParameters(path, set) {
  const row = (name, value, unit) => `${name.padEnd(22)} ${String(value).padEnd(6)} ${unit}`;
  const rows = searched.map(({ name, unit }) => row(name, set[name], unit));
  writeFileSync(path, `${[row('name', 'value', 'unit'), ...rows].join('\n')}\n`);
}

export function calibrate() {
  const setup = readSetup('model/control.txt');
  const observed = readObserved();
  const rate = rater(setup, observed, windows.calibration);
  const best = search(rate, { seed: 1, random: 800, local: 800 });
  writeParameters('model/parameters.txt', best.set);
  writeTable('calibration/sensitivity.csv', sensitivity(rate, best));
  const wet = search(rater(setup, observed, windows.wetYears), { seed: 2, random: 400, local: 500 });
  writeParameters('model/parameters-wet-years.txt', wet.set);
}
