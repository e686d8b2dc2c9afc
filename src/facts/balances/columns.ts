import { defined, isDefined, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import type { BalanceVolume, Term } from '../../manifest/data.generated.ts';
import { convertSeries } from '../../series/convert-series.ts';
import type { Series } from '../../series/series.ts';
import { parseUnit } from '../../series/units/parse-unit.ts';

export type Side = 'inflow' | 'outflow' | 'storage' | 'potential';

/** One column of a control volume. */
export interface BalanceColumn {
  readonly side: Side;
  /** The term's name; for a store its column. */
  readonly name: string;
  readonly column: string | number;
  /** Its own unit; undefined where it has the record's. */
  readonly unit: string | undefined;
}

/** Every column that a balance names, in the manifest's order. */
export function columnsOf(volume: BalanceVolume): readonly BalanceColumn[] {
  const { inflow = {}, outflow = {}, storage = [], potential_evapotranspiration: potential } = volume;
  const flows = (side: Side, terms: Readonly<Record<string, Term>>) =>
    Object.entries(terms).map(([name, term]) => columnOf(side, term, name));
  return [
    ...flows('inflow', inflow),
    ...flows('outflow', outflow),
    ...[storage].flat().map((term) => columnOf('storage', term)),
    ...(potential === undefined ? [] : [columnOf('potential', potential)]),
  ];
}

function columnOf(side: Side, term: Term, name?: string): BalanceColumn {
  const { values: column, unit } = typeof term === 'object' ? term : { values: term, unit: undefined };
  return { side, name: name ?? String(column), column, unit };
}

/** A column as amounts for each step. */
export interface Amounts extends BalanceColumn {
  readonly series: Series;
}

/**
 * The unit in which amounts are added up: the record's where that is an amount (`mm`, `m3`), else what it flows (`mm/d` gives mm, `m3/s`
 * gives m3); empty where the record has none, and then the columns are taken as they stand.
 */
export function unitOfTotals(unit: string | undefined): Statistic<string> {
  if (unit === undefined) return defined('');
  const parsed = parseUnit(unit);
  if (!isDefined(parsed)) return parsed;
  const [length, , time, , , , , month] = parsed.value.dimension;
  if (time === 0 && month === 0) return defined(unit);
  if (length === 1) return defined('mm');
  return length === 3
    ? defined('m3')
    : undefinedBecause(`${unit} is no flow of water; state amounts for each step`);
}

/** Columns brought to one unit. Undefined where one does not fit. */
export function inOneUnit(
  columns: readonly Amounts[],
  unit: string | undefined,
  areaKm2: number | null,
): Statistic<readonly Amounts[]> {
  const totals = unitOfTotals(unit);
  if (!isDefined(totals)) return totals;
  const brought: Amounts[] = [];
  for (const column of columns) {
    if (totals.value === '') {
      if (column.unit !== undefined)
        return undefinedBecause(`${column.column} has a unit of its own, but the record has none (\`unit\`)`);
      brought.push(column);
      continue;
    }
    // A store is an amount, whatever unit the flows beside it have.
    const from = column.unit ?? (column.side === 'storage' ? totals.value : (unit ?? ''));
    const over = areaKm2 === null ? {} : { areaKm2 };
    const series = convertSeries({ ...column.series, unit: from }, totals.value, over);
    if (!isDefined(series)) return undefinedBecause(`${column.column}: ${series.undefined}`);
    brought.push({ ...column, series: series.value });
  }
  return defined(brought);
}
