import { defined, type Statistic, undefinedBecause } from '../paired.ts';
import { type RatedStep, ratingTables } from '../tables/performance-ratings.ts';

export interface RatingBasis {
  readonly table: string;
  readonly step: RatedStep;
  readonly variable: string;
}

/** By name: every table, time step and variable that limits are published for. */
export const ratingBases: ReadonlyMap<string, RatingBasis> = new Map(
  ratingTables.flatMap((table) =>
    table.rows.flatMap((row) =>
      row.steps.flatMap((step) =>
        row.variables.map((variable) => {
          const short = variable === 'streamflow' ? 'flow' : variable.replaceAll(' ', '-');
          return [`${table.id}-${step}-${short}`, { table: table.id, step, variable }] as const;
        }),
      ),
    ),
  ),
);

/**
 * What a record means that says it is rated by `moriasi-2015-daily-flow`.
 *
 * Formula: <table>-<step>-<variable>, streamflow written `flow`, blanks as hyphens
 * Inputs: the name.
 * Range: one of the published table, step and variable.
 * Read: a rating without its time step is incomplete, so the name holds it; hand the result on to `rateScore`.
 * Undefined: no table publishes limits under that name.
 * Source: definition.
 * Example: ratingBasis('moriasi-2015-daily-flow') -> {value: {table: 'moriasi-2015', step: 'daily', variable: 'streamflow'}}
 */
export function ratingBasis(name: string): Statistic<RatingBasis> {
  const basis = ratingBases.get(name);
  return basis ? defined(basis) : undefinedBecause(`no published table gives limits named ${name}`);
}
