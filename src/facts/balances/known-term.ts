import type { BalanceTerm } from './balance-of.ts';

const known = {
  precipitation: { side: 'inflow', names: ['precipitation', 'rain', 'rainfall', 'snowfall'] },
  streamflow: { side: 'outflow', names: ['streamflow', 'runoff', 'discharge'] },
  evapotranspiration: {
    side: 'outflow',
    names: ['evapotranspiration', 'evaporation', 'transpiration', 'interception'],
  },
} as const;

/** The total of the terms that go by the names of a quantity; undefined where none does. */
export function knownTerm(
  terms: readonly Pick<BalanceTerm, 'side' | 'name' | 'total'>[],
  quantity: keyof typeof known,
): number | undefined {
  const { side, names } = known[quantity];
  const meant = terms.filter(
    (term) => term.side === side && (names as readonly string[]).includes(term.name.toLowerCase()),
  );
  return meant.length === 0 ? undefined : meant.reduce((sum, term) => sum + term.total, 0);
}
