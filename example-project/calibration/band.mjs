// The 95 % band of daily flow: 200 parameter sets nearly as good as the best, each with rain that could have
// fallen instead and a gauge that errs. Writes the sets and the band.
import { round, writeTable } from '../model/table.mjs';
import { readParameters, readSetup } from '../model/two-store.mjs';
import { makeSet, rater, readObserved, searched, simulatedFlow, windows } from './calibrate.mjs';
import { seededRandom } from './random.mjs';

const members = 200;
/** A set is behavioural when its objective is at most this much below the best. */
const tolerated = 0.04;
/** Standard deviations, as shares: catchment rain of a day (within 0.4 to 1.6), and gauged flow. */
const rainError = 0.3;
const ratingError = 0.08;

/** Sets drawn around the best (a tenth of each range to either side) that fit nearly as well. */
function behaviouralSets(setup, observed, best, { uniform }) {
  const rate = rater(setup, observed, windows.calibration);
  const enough = rate(best) - tolerated;
  const sets = [];
  while (sets.length < members) {
    const set = makeSet(
      ({ name, range: [low, high] }) => best[name] + (uniform() - 0.5) * 0.2 * (high - low),
    );
    if (rate(set) >= enough) sets.push(set);
  }
  return sets;
}

/** The value below which a share of the sorted values lies, between neighbours by their distance. */
function quantile(sorted, share) {
  const place = share * (sorted.length - 1);
  const below = Math.floor(place);
  const above = Math.min(below + 1, sorted.length - 1);
  return sorted[below] + (place - below) * (sorted[above] - sorted[below]);
}

export function makeBand() {
  const chance = seededRandom(95);
  const setup = readSetup('model/control.txt');
  const sets = behaviouralSets(setup, readObserved(), readParameters('model/parameters.txt'), chance);
  const columns = searched.map(({ name }) => [name, sets.map((set) => set[name])]);
  writeTable('calibration/behavioural.csv', Object.fromEntries(columns));

  const flows = sets.map((set) => {
    const factor = () => Math.min(1.6, Math.max(0.4, 1 + rainError * chance.normal()));
    const otherRain = setup.rain.map((depth) => round(depth * factor(), 2));
    const flow = simulatedFlow({ ...setup, rain: otherRain }, set);
    return flow.map((value) => value * Math.max(0, 1 + ratingError * chance.normal()));
  });
  const byDay = setup.dates.map((_, day) => flows.map((flow) => flow[day]).sort((a, b) => a - b));
  writeTable('runs/calibrated/band.csv', {
    date: setup.dates,
    low: byDay.map((sorted) => round(quantile(sorted, 0.025), 3)),
    high: byDay.map((sorted) => round(quantile(sorted, 0.975), 3)),
  });
}
