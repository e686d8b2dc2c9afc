import type { Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { balancesOf } from './balances.ts';
import { bandsOf } from './bands.ts';
import { scenariosOf } from './conditions.ts';
import type { Facts } from './facts.ts';
import { profilesOf } from './profiles.ts';
import { rainYearsOf } from './rain-years.ts';
import { scoresOf } from './scores.ts';
import { seasonsOf } from './seasons.ts';
import { storesOf } from './store-drift.ts';

/** What is remembered by the content of the files it comes from. */
export type WorkedOut = Pick<
  Facts,
  'profiles' | 'scores' | 'rainYears' | 'stores' | 'seasons' | 'balances' | 'bands' | 'scenarios'
>;

/** Computes all that takes long because it reads whole series. */
export async function workOut(records: Records, snapshot: Snapshot): Promise<WorkedOut> {
  const rain = rainYearsOf(records, snapshot);
  const [profiles, scores, rainYears, stores, seasons, balances, bands, scenarios] = await Promise.all([
    profilesOf(records, snapshot),
    scoresOf(records, snapshot),
    rain,
    rain.then((years) => storesOf(records, years, snapshot)),
    seasonsOf(records, snapshot),
    balancesOf(records, snapshot),
    bandsOf(records, snapshot),
    scenariosOf(records, snapshot),
  ]);
  return { profiles, scores, rainYears, stores, seasons, balances, bands, scenarios };
}
