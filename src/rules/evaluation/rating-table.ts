import { isDefined } from '../../hydrology/paired.ts';
import { type RatingBasis, ratingBases, ratingBasis } from '../../hydrology/ratings/rating-basis.ts';
import type { RatedStep } from '../../hydrology/tables/performance-ratings.ts';
import { nearestName } from '../../manifest/nearest.ts';

/** The table by which a target is rated. */
export interface RatingTable {
  /** Null where none is published for the variable at that step. */
  readonly id: string | null;
  readonly basis: RatingBasis | null;
  /** Why the name in the record does not serve; null where it does, or there is none. */
  readonly fault: string | null;
  /** The names that serve. */
  readonly known: readonly string[];
}

const ratedSteps: Readonly<Record<string, RatedStep>> = { P1D: 'daily', P1M: 'monthly', P1Y: 'annual' };

/** The record's own table if it publishes limits for the variable and step (ISO 8601 duration); else the first that does. */
export function ratingTable(named: string | undefined, variable: string, step: string): RatingTable {
  const ratedStep = ratedSteps[step];
  const serving = [...ratingBases].filter(
    ([, basis]) => basis.variable === variable && basis.step === ratedStep,
  );
  const known = serving.map(([id]) => id);
  const [id, basis] = serving.find(([one]) => one === named) ?? serving[0] ?? [null, null];
  if (named === undefined || id === named) return { id, basis, fault: null, known };
  const nearest = nearestName(named, ratingBases.keys());
  const fault = isDefined(ratingBasis(named))
    ? `${named} publishes no limits for ${ratedStep ?? step} values of ${variable.replaceAll('_', ' ')}`
    : `no published table is called ${named}${nearest === undefined ? '' : ` (the nearest name is ${nearest})`}`;
  return { id, basis, fault, known };
}
