import { longestDrySpells } from '../../hydrology/forcing/longest-dry-spells.ts';
import { type Run, stuckRuns } from '../../hydrology/forcing/stuck-runs.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { isCustomaryMissingCode } from '../../series/missing-codes.ts';
import { type Listed, listedAtMost, type SeriesColumn, type SeriesTable } from '../../series/table.ts';
import { type Place, placeOf, type Valued } from './places.ts';
import { type RainExtremes, rainExtremes } from './rain-extremes.ts';

/** Steps in a row with one equal value. */
export interface EqualRun {
  readonly value: number;
  readonly steps: number;
  readonly first: Place;
  readonly last: Place;
}

/** A value that data sets customarily write for a missing one, and how often it stands there as a value. */
export interface SuspectedCode extends Valued {
  readonly count: number;
}

/** What one column of a file holds; figures in the file's unit, over the values that are there. */
export interface ColumnProfile {
  readonly name: string;
  /** Values that are there; `missing` counts the rows that hold a declared code instead. */
  readonly values: number;
  readonly missing: number;
  /** Steps between first and last row that no row holds. */
  readonly absent: number;
  readonly total: number;
  /** Null without values. */
  readonly lowest: Valued | null;
  readonly highest: Valued | null;
  readonly negative: Listed<Valued>;
  readonly suspectedCodes: readonly SuspectedCode[];
  /** The longest runs of one equal value other than zero, longest first; none shorter than three steps. */
  readonly equalRuns: readonly EqualRun[];
  /** The longest run of zeros, and how long the next one is; null with fewer than two. */
  readonly drySpells: { readonly longest: EqualRun; readonly nextSteps: number } | null;
  /** Of rain in a unit that gives a depth. */
  readonly rain: RainExtremes | null;
}

const shortestRun = 3;
const runsKept = 5;
const codesKept = 5;

export function columnProfile(table: SeriesTable, column: SeriesColumn, isRain: boolean): ColumnProfile {
  const negative: number[] = [];
  let negatives = 0;
  const codes = new Map<number, { row: number; count: number }>();
  let total = 0;
  let lowest = -1;
  let highest = -1;
  const { values } = column;
  for (let row = 0; row < values.length; row++) {
    const value = values[row] as number;
    if (Number.isNaN(value)) continue;
    total += value;
    if (lowest < 0 || value < (values[lowest] as number)) lowest = row;
    if (highest < 0 || value > (values[highest] as number)) highest = row;
    if (value >= 0) continue;
    if (negatives++ < listedAtMost) negative.push(row);
    if (!isCustomaryMissingCode(value)) continue;
    const code = codes.get(value);
    if (code !== undefined) code.count++;
    else if (codes.size < codesKept) codes.set(value, { row, count: 1 });
  }
  const valued = (row: number): Valued => ({ value: values[row] as number, ...placeOf(table, row) });
  return {
    name: column.name,
    values: values.length - column.missing,
    missing: column.missing,
    absent: table.absent.total,
    total,
    lowest: lowest < 0 ? null : valued(lowest),
    highest: highest < 0 ? null : valued(highest),
    negative: { total: negatives, first: negative.map(valued) },
    suspectedCodes: Array.from(codes.values(), ({ row, count }) => ({ ...valued(row), count })),
    ...runsIn(table, values),
    rain: isRain ? rainExtremes(table, values) : null,
  };
}

function runsIn(table: SeriesTable, values: Float64Array): Pick<ColumnProfile, 'equalRuns' | 'drySpells'> {
  const { spaced, rowOf } = withGaps(table, values);
  const told = ({ value, length, first, last }: Run): EqualRun => ({
    value,
    steps: length,
    first: placeOf(table, rowOf(first)),
    last: placeOf(table, rowOf(last)),
  });
  const runs = stuckRuns({ values: spaced, minimumLength: shortestRun, of: 'non-zero' });
  const longest = runs.toSorted((one, other) => other.length - one.length || one.first - other.first);
  const dry = longestDrySpells(spaced);
  return {
    equalRuns: longest.slice(0, runsKept).map(told),
    drySpells: isDefined(dry) ? { longest: told(dry.value.longest), nextSteps: dry.value.nextLength } : null,
  };
}

/** The values with a missing one wherever steps are absent, so that no run goes over a gap. */
function withGaps(
  { timeSeconds, absent, step }: SeriesTable,
  values: Float64Array,
): { readonly spaced: ArrayLike<number>; readonly rowOf: (place: number) => number } {
  if (absent.total === 0 || step?.kind !== 'seconds') return { spaced: values, rowOf: (place) => place };
  const spaced: number[] = [];
  const rows: number[] = [];
  for (let row = 0; row < values.length; row++) {
    const before = timeSeconds[row - 1] ?? Number.POSITIVE_INFINITY;
    if ((timeSeconds[row] as number) - before > step.length) {
      spaced.push(Number.NaN);
      rows.push(row);
    }
    spaced.push(values[row] as number);
    rows.push(row);
  }
  return { spaced, rowOf: (place) => rows[place] ?? 0 };
}
