// Computes every figure that stoplog.yaml states, from the files as they stand, and prints each under the
// place where it is stated:
//
//   node calibration/figures.mjs
import { readTable } from '../model/table.mjs';
import { readObserved, windows } from './calibrate.mjs';
import { average, deviation, kge, logNse, nse, pairs, pbias, r2 } from './scores.mjs';

process.chdir(`${import.meta.dirname}/..`);

const calibrated = 'runs/calibrated/daily.csv';
const dry = 'runs/dry-2050/daily.csv';
const dryYears = 'runs/dry-years/daily.csv';
const afterWarmUp = '2003-10-01';
const dryWindow = ['2043-10-01', '2055-09-30'];
const summer = [4, 9];
const stores = ['snow_mm', 'soil_mm', 'channel_mm', 'groundwater_mm', 'reservoir_mm'];

function column(file, name) {
  return readTable(file).map((row) => Number(row[name]));
}

function days(file) {
  return readTable(file).map(({ date }) => date);
}

function total(values) {
  return values.reduce((sum, value) => sum + value, 0);
}

/** Share of rows whose value is one of the missing codes. */
function missingShare(file, name, codes) {
  const values = readTable(file).map((row) => row[name]);
  return (values.filter((value) => codes.includes(value)).length / values.length).toFixed(4);
}

function scores(file, over) {
  const paired = pairs(days(file), readObserved(), column(file, 'flow_m3s'), over);
  const all = { nse, log_nse: logNse, pbias, r2, kge };
  return Object.fromEntries(Object.entries(all).map(([name, score]) => [name, score(paired).toFixed(2)]));
}

/** Sum of a column of the calibrated run after warm-up. */
function sum(name) {
  return total(column(calibrated, name).slice(days(calibrated).indexOf(afterWarmUp)));
}

function ratio(one, other) {
  return (sum(one) / sum(other)).toFixed(3);
}

/** The balance of a control volume in the calibrated run after warm-up: mm over the catchment. */
function balance(inflows, outflows, stores) {
  const before = days(calibrated).indexOf(afterWarmUp) - 1;
  const stored = stores.map((name) => column(calibrated, name));
  const change = total(stored.map((values) => values.at(-1) - values[before]));
  const [inflow, outflow] = [inflows, outflows].map((names) => total(names.map(sum)));
  return {
    residual_share: Math.abs((inflow - outflow - change) / inflow).toFixed(6),
    storage_change: change.toFixed(1),
    ...Object.fromEntries([...inflows, ...outflows].map((name) => [name, sum(name).toFixed(1)])),
  };
}

/** Totals of hydrological years (October to September), or of some of their months, within a window. */
function yearly(file, name, [first, last], months = [1, 12]) {
  const byYear = new Map();
  for (const row of readTable(file)) {
    const month = Number(row.date.slice(5, 7));
    if (row.date < first || row.date > last || month < months[0] || month > months[1]) continue;
    const year = Number(row.date.slice(0, 4)) + (month >= 10 ? 1 : 0);
    byYear.set(year, (byYear.get(year) ?? 0) + Number(row[name]));
  }
  const totals = [...byYear.values()];
  const range = [average(totals), Math.min(...totals), Math.max(...totals)].map((value) => value.toFixed(1));
  return { mean: range[0], lowest: range[1], highest: range[2] };
}

/** Share of observations inside the band, and its mean width over the observed standard deviation (n - 1). */
function band() {
  const file = 'runs/calibrated/band.csv';
  const low = pairs(days(file), readObserved(), column(file, 'low'), windows.validation);
  const high = pairs(days(file), readObserved(), column(file, 'high'), windows.validation);
  const { observed } = low;
  const inside = observed.filter((flow, day) => flow >= low.simulated[day] && flow <= high.simulated[day]);
  const width = average(high.simulated) - average(low.simulated);
  const sampleDeviation = deviation(observed) * Math.sqrt(observed.length / (observed.length - 1));
  return {
    coverage: (inside.length / observed.length).toFixed(2),
    relative_width: (width / sampleDeviation).toFixed(2),
  };
}

/** Water taken for irrigation from June to August as a share of the gauged flow of those months. */
function irrigationShare() {
  const summer = (time) => ['06', '07', '08'].includes(time.slice(5, 7));
  const taken = readTable('data/management/irrigation.csv').filter(({ month }) => summer(month));
  const flow = readTable('data/flow/old-mill.csv').filter((row) => summer(row.date) && row.flow_m3s !== 'NA');
  const mean = (rows, name) => average(rows.map((row) => Number(row[name])));
  return (mean(taken, 'taken_m3s') / mean(flow, 'flow_m3s')).toFixed(4);
}

print('inputs.rainfall.missing_share.per_file', {
  'fennock-bridge': missingShare('data/rain/fennock-bridge.csv', 'rain_mm', ['', '-9.9']),
  'sallow-rigg': missingShare('data/rain/sallow-rigg.csv', 'rain_mm', ['', '-9.9']),
  'high-tarrow': missingShare('data/rain/high-tarrow.csv', 'rain_mm', ['', '-9.9']),
});
print('inputs.streamflow', { missing_share: missingShare('data/flow/old-mill.csv', 'flow_m3s', ['NA']) });
print('evaluation.outlet-flow.scores.calibration', scores(calibrated, windows.calibration));
print('evaluation.outlet-flow.scores.validation', scores(calibrated, windows.validation));
print('evaluation.dry-years.scores.calibration', scores(dryYears, windows.wetYears));
print('evaluation.dry-years.scores.validation', scores(dryYears, windows.dryYears));
print('balance.catchment.stated', balance(['rain_mm'], ['flow_mm', 'et_mm', 'supply_mm'], stores));
print('balance.catchment.stated', {
  runoff_ratio: ratio('flow_mm', 'rain_mm'),
  evaporative_ratio: ratio('et_mm', 'rain_mm'),
  aridity: ratio('pet_mm', 'rain_mm'),
});
print('balance.aquifer.stated', balance(['recharge_mm'], ['base_flow_mm'], ['groundwater_mm']));
print('interventions', { 'irrigation as a share of summer flow': irrigationShare() });
print('uncertainty.bands.outlet-flow.stated', band());
print('scenarios.conditions.annual_rainfall.stated', yearly(calibrated, 'rain_mm', windows.calibration[0]));
print(
  'scenarios.conditions.summer_evapotranspiration.stated',
  yearly(calibrated, 'pet_mm', windows.calibration[0], summer),
);
print(
  'scenarios.cases.dry-2050.drivers.annual_rainfall.stated',
  yearly('data/scenarios/dry-2050.csv', 'rain_mm', dryWindow),
);
print(
  'scenarios.cases.dry-2050.drivers.summer_evapotranspiration.stated',
  yearly(dry, 'pet_mm', dryWindow, summer),
);

function print(place, figures) {
  const texts = Object.entries(figures).map(([name, figure]) => `${name} ${figure}`);
  process.stdout.write(`${place}: ${texts.join(', ')}\n`);
}
