import { total } from '../../hydrology/arithmetic.ts';
import { budykoCurve } from '../../hydrology/balance/budyko-curve.ts';
import { fuParameter } from '../../hydrology/balance/fu-parameter.ts';
import { type WaterBalance, waterBalance } from '../../hydrology/balance/water-balance.ts';
import { waterRatios } from '../../hydrology/balance/water-ratios.ts';
import { defined, isDefined, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import type { YearBegins } from '../../series/hydrological-year.ts';
import type { Days } from '../over.ts';
import type { Amounts, Side } from './columns.ts';
import { knownTerm } from './known-term.ts';
import { followsOn, type RowSpan, rowsOver, toldSteps } from './spans.ts';
import { type YearOfBalance, yearsOf } from './years.ts';

/** What a control volume's columns give over a window; all amounts in one unit. */
export interface RecomputedBalance extends Omit<WaterBalance, 'storageChangeMm'> {
  /** `mm`, `m3`; empty where the record has no unit. */
  readonly unit: string;
  /** The first and the last step. */
  readonly first: string;
  readonly last: string;
  readonly terms: readonly BalanceTerm[];
  /** Null where no storage is named: the balance is then taken without. */
  readonly storageChangeMm: number | null;
  readonly runoffRatio: Statistic;
  readonly evaporativeRatio: Statistic;
  /** Potential evapotranspiration over precipitation. */
  readonly aridity: Statistic;
  /** The evaporative ratio that Budyko's curve gives for that aridity. */
  readonly budyko: Statistic;
  /** The parameter of Fu's curve on which the volume lies. */
  readonly fu: Statistic;
  /** Complete hydrological years inside the window. */
  readonly years: readonly YearOfBalance[];
}

/** One flow, or the potential evapotranspiration. */
export interface BalanceTerm {
  readonly side: Exclude<Side, 'storage'>;
  readonly name: string;
  readonly total: number;
  /** Steps with a value below zero, and the lowest value. */
  readonly negativeSteps: number;
  readonly lowest: number;
}

export interface BalanceBasis {
  readonly columns: readonly Amounts[];
  readonly unit: string;
  readonly yearBegins: YearBegins;
  /** All that is stored before the first row; undefined where nobody says. */
  readonly storageBefore: number | undefined;
}

/**
 * The balance over days. Storage changes from the end of the step before the first one to the end of the last. Undefined
 * where rows or values are missing, or nothing says what was stored before.
 */
export function balanceOf(basis: BalanceBasis, days: Days): Statistic<RecomputedBalance> {
  const { columns, yearBegins, unit } = basis;
  const [any] = columns;
  if (any === undefined) return undefinedBecause('no columns are named');
  const rows = rowsOver(any.series, days, yearBegins);
  if (!isDefined(rows)) return rows;
  const missing = missingIn(columns, rows.value);
  if (missing !== null) return undefinedBecause(missing);
  const flows = columns.filter(({ side }) => side !== 'storage');
  const terms = flows.map((column) => termOf(column, rows.value));
  const stored = storedOver(basis, rows.value);
  if (!isDefined(stored)) return stored;
  const totals = (side: Side) => terms.filter((term) => term.side === side).map((term) => term.total);
  const { storageChangeMm, ...balance } = waterBalance({
    inflowsMm: totals('inflow'),
    outflowsMm: totals('outflow'),
    storageBeforeMm: stored.value?.before ?? 0,
    storageAfterMm: stored.value?.after ?? 0,
  });
  const [first, last] = toldSteps(any.series, rows.value);
  return defined({
    ...balance,
    unit,
    first,
    last,
    terms,
    storageChangeMm: stored.value === null ? null : storageChangeMm,
    ...position(terms),
    years: yearsOf(columns, rows.value, yearBegins),
  });
}

function missingIn(columns: readonly Amounts[], rows: readonly RowSpan[]): string | null {
  for (const { column, series } of columns) {
    const missing = rows.reduce(
      (sum, { first, end }) => sum + series.values.subarray(first, end).filter(Number.isNaN).length,
      0,
    );
    if (missing > 0) return `${column} has ${missing} missing values in the window`;
  }
  return null;
}

function termOf({ side, name, series }: Amounts, rows: readonly RowSpan[]): BalanceTerm {
  let [negativeSteps, lowest] = [0, Number.POSITIVE_INFINITY];
  const totals = rows.map(({ first, end }) => {
    const values = series.values.subarray(first, end);
    for (const value of values) {
      if (value < 0) negativeSteps++;
      if (value < lowest) lowest = value;
    }
    return total(values);
  });
  return { side: side as BalanceTerm['side'], name, total: total(totals), negativeSteps, lowest };
}

/** What all stores hold before and after, added over the stretches of the window; null where no store is named. */
function storedOver(
  { columns, storageBefore }: BalanceBasis,
  rows: readonly RowSpan[],
): Statistic<{ readonly before: number; readonly after: number } | null> {
  const stores = columns.filter(({ side }) => side === 'storage').map(({ series }) => series);
  const [any] = stores;
  if (any === undefined) return defined(null);
  const all = (row: number) => total(stores.map(({ values }) => values[row] ?? Number.NaN));
  let [before, after] = [0, 0];
  for (const { first, end } of rows) {
    const begun = first === 0 ? (storageBefore ?? Number.NaN) : all(first - 1);
    if (first === 0 && storageBefore === undefined)
      return undefinedBecause(
        'the window begins with the file, so what was stored before is not known (`storage_before`)',
      );
    if (first > 0 && !followsOn(any.timeSeconds, first, any.step))
      return undefinedBecause('the step before the window is not in the file');
    if (Number.isNaN(begun)) return undefinedBecause('a store has no value on the step before the window');
    before += begun;
    after += all(end - 1);
  }
  return defined({ before, after });
}

/** Where a volume with rain lies between water and energy. */
function position(
  terms: readonly BalanceTerm[],
): Pick<RecomputedBalance, 'runoffRatio' | 'evaporativeRatio' | 'aridity' | 'budyko' | 'fu'> {
  const [rain, runoff, evaporated] = (['precipitation', 'streamflow', 'evapotranspiration'] as const).map(
    (known) => knownTerm(terms, known),
  );
  const potential = terms.find(({ side }) => side === 'potential')?.total;
  const ratios = waterRatios({
    rainfallMm: rain ?? 0,
    runoffMm: runoff ?? 0,
    evapotranspirationMm: evaporated ?? 0,
    potentialMm: potential ?? 0,
  });
  const known = (part: number | undefined, what: string, ratio: Statistic): Statistic => {
    if (rain === undefined) return undefinedBecause('no inflow is named `precipitation`');
    return part === undefined ? undefinedBecause(what) : ratio;
  };
  const aridity = known(potential, 'no `potential_evapotranspiration` is named', ratios.aridity);
  const evaporativeRatio = known(
    evaporated,
    'no outflow is named `evapotranspiration`',
    ratios.evaporativeIndex,
  );
  return {
    runoffRatio: known(runoff, 'no outflow is named `streamflow`', ratios.runoffRatio),
    evaporativeRatio,
    aridity,
    budyko: isDefined(aridity) ? budykoCurve(aridity.value) : aridity,
    fu: !isDefined(aridity)
      ? aridity
      : !isDefined(evaporativeRatio)
        ? evaporativeRatio
        : fuParameter({ aridity: aridity.value, evaporativeIndex: evaporativeRatio.value }),
  };
}
