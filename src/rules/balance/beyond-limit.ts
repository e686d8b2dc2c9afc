import type { RecomputedBalance } from '../../facts/balances/balance-of.ts';
import { knownTerm } from '../../facts/balances/known-term.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { computedBalance } from './computed-balance.ts';
import { shortYears } from './short-years.ts';

/** Columns are rounded, so that what is equal may differ by its last digits. */
const rounding = 1e-6;

export const balanceBeyondLimit = rule({
  id: 'balance.beyond-limit',
  scope: 'balance',
  from: 'validation',
  means: null,
  acceptable: true,
  statement:
    'Evapotranspiration is above what rain and stores can give (water) or above potential evapotranspiration (energy; warns where that is for grass), runoff is above all inflow, or a term is negative.',
  why: 'Over years a catchment evaporates no more than falls on it and no more than the sun can lift. Beyond that, water is imported, a store runs dry, or the forcing is wrong.',
  source: {
    basis: 'published',
    citation: 'Budyko, M. I. (1974) Climate and Life. Academic Press, New York',
  },
  clear:
    'Check rain, area and potential evapotranspiration. Where water is imported or forest and open water evaporate more than grass, say so under `accepts`, with name and date.',
  limits: {
    short_years: shortYears,
  },
  check: (record, { balances }, limits) => {
    const balance = computedBalance(record, balances);
    if (balance === null) return [];
    const about = {
      record: record.id,
      field: record.field,
      ...(balance.unit === '' ? {} : { unit: balance.unit }),
    };
    return [
      ...beyond(balance, limits.short_years ?? 0, record.fragment.potential_for === 'grass'),
      ...negative(balance),
    ].map((draft) => ({ ...about, ...draft }));
  },
});

type Part = Omit<Draft, 'record' | 'field'>;

function beyond(balance: RecomputedBalance, fewestYears: number, isForGrass: boolean): readonly Part[] {
  const { terms, storageChangeMm: stored, inflowMm: inflow, budyko, evaporativeRatio } = balance;
  const [rain, runoff, evaporated] = (['precipitation', 'streamflow', 'evapotranspiration'] as const).map(
    (quantity) => knownTerm(terms, quantity),
  );
  const potential = terms.find(({ side }) => side === 'potential')?.total;
  const isAbove = (part: number | undefined, limit: number | undefined) =>
    part !== undefined && limit !== undefined && part > limit * (1 + rounding);
  // What the stores gave may be used up; where they are left out, only long windows tell.
  const taken = stored === null ? 0 : Math.max(0, -stored);
  const storageTells = stored !== null || balance.years.length >= fewestYears;
  const parts: Part[] = [];
  if (storageTells && rain !== undefined && isAbove(evaporated, rain + taken))
    parts.push({
      subject: 'water',
      found: rounded(evaporated),
      message: `Evapotranspiration of ${told(evaporated)} is above the rain of ${told(rain)}${taken > 0 ? ` and the ${told(taken)} taken from storage` : ''}${inflow > rain ? `; other inflows bring ${told(inflow - rain)}` : ''}.`,
    });
  if (isAbove(evaporated, potential))
    parts.push({
      subject: 'energy',
      found: rounded(evaporated),
      ...(isForGrass ? { from: 'warn' as const } : {}),
      message: `Evapotranspiration of ${told(evaporated)} is above the potential of ${told(potential)}${isForGrass ? ', which is for grass: forest, interception and open water may evaporate more' : ''}.`,
      detail:
        isDefined(budyko) && isDefined(evaporativeRatio)
          ? [
              `evaporative ratio ${figure(evaporativeRatio.value)}; Budyko’s curve gives ${figure(budyko.value)}`,
            ]
          : [],
    });
  if (storageTells && rain !== undefined && isAbove(runoff, inflow + taken))
    parts.push({
      subject: 'runoff',
      found: rounded(runoff),
      message: `Streamflow of ${told(runoff)} is above all that flows in, ${told(inflow)}${taken > 0 ? `, and the ${told(taken)} taken from storage` : ''}.`,
    });
  return parts;
}

/** Rain and streamflow are never negative; other terms may be on single steps (dew, capillary rise). */
function negative({ terms }: RecomputedBalance): readonly Part[] {
  return terms.flatMap((term) => {
    const { name, side, total, negativeSteps, lowest } = term;
    const isNeverNegative =
      side !== 'potential' &&
      [knownTerm([term], 'precipitation'), knownTerm([term], 'streamflow')].some(
        (known) => known !== undefined,
      );
    if (!(total < 0 || (isNeverNegative && negativeSteps > 0))) return [];
    return {
      subject: `negative ${name}`,
      found: total < 0 ? rounded(total) : rounded(lowest),
      message:
        total < 0
          ? `The total of ${name} is negative, ${told(total)}: it flows the other way, or has the wrong sign.`
          : `${name} is negative on ${figure(negativeSteps)} steps, ${figure(lowest)} at the lowest.`,
    };
  });
}

function told(amount: number | undefined): string {
  return figure(amount ?? 0);
}

function rounded(amount: number | undefined): number {
  return Number((amount ?? 0).toPrecision(6));
}
