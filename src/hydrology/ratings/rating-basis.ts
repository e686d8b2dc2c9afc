import { defined, type Statistic, undefinedBecause } from '../paired.ts';
import { type RatedStep, ratingTables } from '../tables/performance-ratings.ts';

export interface RatingBasis {
  readonly table: string;
  readonly step: RatedStep;
  readonly variable: string;
}

/**
 * Every name under which a record can say what it is rated by: table, time step and variable, such as `moriasi-2015-daily-flow`.
 *
 * Formula: <table>-<step>-<variable>, streamflow written `flow`, blanks as hyphens
 * Inputs: none.
 * Range: one name for each step and variable that a table publishes limits for.
 * Read: a rating without its time step is incomplete, so the name holds it.
 * Undefined: never.
 * Source: definition.
 * Example: ratingBases().has('moriasi-2007-monthly-phosphorus') -> true
 */
export function ratingBases(): ReadonlyMap<string, RatingBasis> {
  const names = new Map<string, RatingBasis>();
  for (const table of ratingTables)
    for (const row of table.rows)
      for (const step of row.steps)
        for (const variable of row.variables) {
          const short = variable === 'streamflow' ? 'flow' : variable.replaceAll(' ', '-');
          names.set(`${table.id}-${step}-${short}`, { table: table.id, step, variable });
        }
  return names;
}

/**
 * What a name such as `moriasi-2015-daily-flow` stands for.
 *
 * Formula: the entry of `ratingBases`
 * Inputs: the name.
 * Range: one of the published table, step and variable.
 * Read: hand the result on to `rateScore`.
 * Undefined: no table publishes limits under that name.
 * Source: definition.
 * Example: ratingBasis('moriasi-2015-daily-flow') -> {value: {table: 'moriasi-2015', step: 'daily', variable: 'streamflow'}}
 */
export function ratingBasis(name: string): Statistic<RatingBasis> {
  const basis = ratingBases().get(name);
  return basis ? defined(basis) : undefinedBecause(`no published table gives limits named ${name}`);
}
