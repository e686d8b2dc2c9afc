/** A slow second witness: pairs by date and formulas as printed, with no code of ours. */

export interface Pair {
  readonly date: string;
  readonly observed: number;
  readonly simulated: number;
}

/** Values by date from a table; what is no number is missing. */
export function columnByDate(table: string, column: string): ReadonlyMap<string, number> {
  const [head = '', ...rows] = table.trimEnd().split('\n');
  const place = head.split(',').indexOf(column);
  return new Map(
    rows.map((row) => {
      const cells = row.split(',');
      return [cells[0] ?? '', Number(cells[place] || 'none')];
    }),
  );
}

/** Days that both have, in any of the windows `first/last`. */
export function pairsIn(
  observed: ReadonlyMap<string, number>,
  simulated: ReadonlyMap<string, number>,
  windows: readonly string[],
): readonly Pair[] {
  return [...observed].flatMap(([date, value]) => {
    const pair = { date, observed: value, simulated: simulated.get(date) ?? Number.NaN };
    const inside = windows.some((window) => date >= window.slice(0, 10) && date <= window.slice(11));
    return inside && Number.isFinite(value) && Number.isFinite(pair.simulated) ? [pair] : [];
  });
}

/** Means of months; a month is left out where more than `lacking` of its days are missing. */
export function monthly(
  values: ReadonlyMap<string, number>,
  lacking: number,
  make: (days: readonly number[]) => number = mean,
): ReadonlyMap<string, number> {
  const months = new Map<string, number[]>();
  for (const [date, value] of values) {
    const month = `${date.slice(0, 7)}-01`;
    months.set(month, [...(months.get(month) ?? []), value]);
  }
  return new Map(
    [...months].map(([month, days]) => {
      const there = days.filter(Number.isFinite);
      return [month, days.length - there.length > lacking ? Number.NaN : make(there)];
    }),
  );
}

export const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
const mean = (values: readonly number[]) => sum(values) / values.length;

/** Nash & Sutcliffe 1970; Gupta et al. 1999, 2009; Moriasi et al. 2007, eqs. 1-3; Pushpalatha et al. 2012. */
export function plainScores(pairs: readonly Pair[]) {
  const observed = pairs.map((pair) => pair.observed);
  const simulated = pairs.map((pair) => pair.simulated);
  const squares = (values: readonly number[]) => sum(values.map((value) => (value - mean(values)) ** 2));
  const errors = sum(pairs.map((pair) => (pair.observed - pair.simulated) ** 2));
  const nse = (of: readonly Pair[]) =>
    1 -
    sum(of.map((pair) => (pair.observed - pair.simulated) ** 2)) / squares(of.map((pair) => pair.observed));
  const offset = mean(observed) / 100;
  const logs = pairs.map((pair) => ({
    ...pair,
    observed: Math.log(pair.observed + offset),
    simulated: Math.log(pair.simulated + offset),
  }));
  const products = sum(
    pairs.map((pair) => (pair.observed - mean(observed)) * (pair.simulated - mean(simulated))),
  );
  const r = products / Math.sqrt(squares(observed) * squares(simulated));
  const alpha = Math.sqrt(squares(simulated) / squares(observed));
  const beta = mean(simulated) / mean(observed);
  return {
    nse: nse(pairs),
    log_nse: nse(logs),
    pbias: (100 * (sum(observed) - sum(simulated))) / sum(observed),
    r,
    r2: r * r,
    rsr: Math.sqrt(errors / squares(observed)),
    /** With n - 1 below and n above: not the published statistic. */
    rsrOfSample: Math.sqrt(errors / pairs.length) / Math.sqrt(squares(observed) / (pairs.length - 1)),
    rmse: Math.sqrt(errors / pairs.length),
    mae: mean(pairs.map((pair) => Math.abs(pair.observed - pair.simulated))),
    kge: 1 - Math.hypot(r - 1, alpha - 1, beta - 1),
    alpha,
    beta,
  };
}
