import { defined, isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import { climatology } from '../hydrology/season/climatology.ts';
import { type SeasonLag, seasonLag } from '../hydrology/season/season-lag.ts';
import type { Season } from '../manifest/data.generated.ts';
import type { RecordNode, Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { Window } from '../series/calendar.ts';
import type { YearBegins } from '../series/hydrological-year.ts';
import { pairByDate } from '../series/pair.ts';
import { monthly } from '../series/step.ts';
import { yearBeginsOf } from './catchment.ts';
import { findInput, readInputSeries } from './input.ts';
import { findOutput, readOutputSeries } from './output.ts';
import { remembered } from './remembered.ts';
import { atStep, type Sides } from './scores/comparable.ts';
import { daysOf, simulatedDays } from './scores/pairings.ts';
import { windowsOfRun } from './windows.ts';

/** By how much a simulated season is late. */
export interface SeasonFigures extends Omit<SeasonLag, 'correlations'> {
  /** Months that both series have, after warm-up. */
  readonly pairs: number;
}

const version = 1;

/** Each stated season, in the manifest's order. */
export async function seasonsOf(
  records: Records,
  snapshot: Snapshot,
): Promise<readonly Statistic<SeasonFigures>[]> {
  const found: Statistic<SeasonFigures>[] = [];
  for (const season of records.manifest.data.seasons ?? [])
    found.push(await compare(season, records, snapshot));
  return found;
}

async function compare(
  { variable = 'other', observed, simulated }: Season,
  records: Records,
  snapshot: Snapshot,
): Promise<Statistic<SeasonFigures>> {
  if (observed === undefined) return undefinedBecause('no observed input is named');
  const input = findInput(observed, records);
  if ('undefined' in input) return input;
  const output = await findOutput(simulated ?? {}, records, snapshot);
  if ('undefined' in output) return output;
  const run = records.nodes.get(`runs.${simulated?.run}`) as RecordNode<'runs'> | undefined;
  const settings = {
    variable,
    yearBegins: yearBeginsOf(records.manifest.data),
    leftOut: daysOf(windowsOfRun(run, records), 'warm-up'),
  };
  const from = { input: input.value.from, output: output.value, ...settings };
  return remembered(snapshot, { what: 'season', version, from }, async () => {
    const seen = await readInputSeries(input.value, records, snapshot);
    if (!isDefined(seen)) return seen;
    const made = await readOutputSeries(output.value, snapshot);
    return isDefined(made) ? lagOf({ observed: seen.value, simulated: made.value }, settings) : made;
  });
}

interface Settings {
  readonly variable: string;
  readonly yearBegins: YearBegins;
  /** The warm-up. */
  readonly leftOut: readonly Window[];
}

function lagOf(sides: Sides, { leftOut, ...settings }: Settings): Statistic<SeasonFigures> {
  const observed = atStep(sides.observed, monthly, settings);
  if (!isDefined(observed)) return observed;
  const simulated = atStep(sides.simulated, monthly, settings);
  if (!isDefined(simulated)) return simulated;
  const windows = simulatedDays({ observed: observed.value, simulated: simulated.value });
  const paired = pairByDate({ observed: observed.value, simulated: simulated.value, windows, leftOut });
  if (!isDefined(paired)) return paired;
  const twelve = climatology(paired.value);
  if (!isDefined(twelve)) return twelve;
  const lag = seasonLag(twelve.value);
  if (!isDefined(lag)) return lag;
  const { correlations: _, ...figures } = lag.value;
  return defined({ ...figures, pairs: paired.value.observed.length });
}
