import { defined, type Statistic, undefinedBecause } from '../paired.ts';
import {
  type RatedStatistic,
  type RatedStep,
  type Rating,
  type RatingRow,
  ratings,
  ratingTables,
} from '../tables/performance-ratings.ts';

export interface RatedScore {
  readonly rating: Rating;
  /** The row that gave it, with limits and status. */
  readonly row: RatingRow;
  readonly source: string;
  /** Set when the value equals a limit on which the article contradicts itself. */
  readonly disputed: string | null;
}

/**
 * Published class of a score: very good, good, satisfactory or unsatisfactory.
 *
 * Formula: the best class whose limit the value reaches; NSE and R2 must be above a limit, RSR may equal it, |PBIAS| must be below it
 * Inputs: the table's id, the statistic with its variable, time step and scale, and the value unrounded; PBIAS in percent.
 * Range: four classes; a table that publishes only the limit of satisfactory gives the two lowest.
 * Read: by the table of the same time step: monthly limits are too strict for daily values and too lax for annual ones.
 * Undefined: no such table, no published row, or a value the statistic cannot take.
 * Variant: the limits of 2007 circulate under a citation of 2015; a record must name its table.
 * Source: Moriasi et al. 2007, Trans. ASABE 50(3):885-900, Table 4; Moriasi et al. 2015, Trans. ASABE 58(6):1763-1785.
 * Example: rateScore({table: 'moriasi-2007', statistic: 'NSE', variable: 'streamflow', step: 'monthly', scale: 'watershed', value: 0.75}) -> {value: {rating: 'good'}}
 */
export function rateScore(of: {
  readonly table: string;
  readonly statistic: RatedStatistic;
  readonly variable: string;
  readonly step: RatedStep;
  readonly scale: 'watershed' | 'field';
  readonly value: number;
}): Statistic<RatedScore> {
  const { statistic, variable, step, scale, value } = of;
  const table = ratingTables.find(({ id }) => id === of.table);
  if (!table) return undefinedBecause(`no rating table is called ${of.table}`);
  const row = table.rows.find(
    (candidate) =>
      candidate.statistic === statistic &&
      candidate.variables.includes(variable) &&
      candidate.steps.includes(step) &&
      candidate.scale === scale,
  );
  if (!row) return undefinedBecause(`${table.id} publishes no ${step} ${statistic} limits for ${variable}`);
  if (!possible(statistic, value)) return undefinedBecause(`${statistic} cannot be ${value}`);
  const place = row.limits.findIndex((limit) => limit !== null && reached(row, value, limit));
  return defined({
    rating: place === -1 ? 'unsatisfactory' : (ratings[place] ?? 'unsatisfactory'),
    row,
    source: table.source,
    disputed: row.disputed && Math.abs(value) === row.disputed.at ? row.disputed.because : null,
  });
}

function reached(row: RatingRow, value: number, limit: number): boolean {
  if (row.reaches === '>') return value > limit;
  return row.reaches === '<=' ? value <= limit : Math.abs(value) < limit;
}

function possible(statistic: RatedStatistic, value: number): boolean {
  if (!Number.isFinite(value)) return false;
  if (statistic === 'PBIAS') return true;
  if (statistic === 'RSR') return value >= 0;
  return value <= 1 && (statistic === 'NSE' || value >= 0);
}
