// How well simulated flow fits observed flow: the usual scores, with their sources.

/**
 * Pairs by day within a list of windows (first and last day included); days without an observation, which
 * hold null, are dropped.
 */
export function pairs(dates, observed, simulated, windows) {
  const inside = (date) => windows.some(([first, last]) => date >= first && date <= last);
  const days = dates.map((_, day) => day).filter((day) => inside(dates[day]));
  const kept = days.filter((day) => observed[day] !== null);
  return { observed: kept.map((day) => observed[day]), simulated: kept.map((day) => simulated[day]) };
}

/** 1 - sum (O - S)^2 / sum (O - mean O)^2: Nash & Sutcliffe 1970, J. Hydrol. 10:282-290. */
export function nse({ observed, simulated }) {
  const mean = average(observed);
  const error = total(observed.map((value, day) => (value - simulated[day]) ** 2));
  return 1 - error / total(observed.map((value) => (value - mean) ** 2));
}

/** NSE of the logarithms, with a hundredth of the observed mean added to both: Pushpalatha et al. 2012. */
export function logNse({ observed, simulated }) {
  const small = average(observed) / 100;
  const log = (values) => values.map((value) => Math.log(value + small));
  return nse({ observed: log(observed), simulated: log(simulated) });
}

/** 100 sum (O - S) / sum O, positive when the model gives too little: Gupta et al. 1999. */
export function pbias({ observed, simulated }) {
  return (100 * (total(observed) - total(simulated))) / total(observed);
}

/** Square of Pearson's correlation. */
export function r2(pairs) {
  return correlation(pairs) ** 2;
}

/** Kling-Gupta efficiency of 2009, with the ratio of standard deviations: J. Hydrol. 377:80-91. */
export function kge(pairs) {
  const { observed, simulated } = pairs;
  const spread = deviation(simulated) / deviation(observed);
  const bias = average(simulated) / average(observed);
  return 1 - Math.sqrt((correlation(pairs) - 1) ** 2 + (spread - 1) ** 2 + (bias - 1) ** 2);
}

/** What the calibration makes as large as it can: low flows matter here as much as the whole. */
export function objective(pairs) {
  return (kge(pairs) + logNse(pairs)) / 2;
}

export function average(values) {
  return total(values) / values.length;
}

/** Root of the mean square departure from the mean. */
export function deviation(values) {
  const mean = average(values);
  return Math.sqrt(average(values.map((value) => (value - mean) ** 2)));
}

function correlation({ observed, simulated }) {
  const [meanObserved, meanSimulated] = [average(observed), average(simulated)];
  const product = average(
    observed.map((value, day) => (value - meanObserved) * (simulated[day] - meanSimulated)),
  );
  return product / (deviation(observed) * deviation(simulated));
}

function total(values) {
  return values.reduce((sum, value) => sum + value, 0);
}
