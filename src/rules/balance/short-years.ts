import type { Limit } from '../rule.ts';

/** Over how long storage may be left out: one threshold, `balance.short_years`, for all rules that ask. */
export const shortYears: Limit = {
  default: 5,
  unit: 'years',
  states: 'fewest complete years over which storage may be left out',
  looser: 'lower',
};
