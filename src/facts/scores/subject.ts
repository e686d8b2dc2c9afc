import { isDefined, type Statistic } from '../../hydrology/paired.ts';
import type { ScoreName } from '../../hydrology/scores.ts';
import type { RecordNode, Records } from '../../records/record.ts';
import type { Snapshot } from '../../repository/snapshot.ts';
import { parseStep } from '../../series/step.ts';
import { areaKm2Of, yearBeginsOf } from '../catchment.ts';
import { findInput, readInputSeries, type Unusable } from '../input.ts';
import { findOutput, readOutputSeries } from '../output.ts';
import type { Basis } from '../remembered.ts';
import { windowsOfTarget } from '../windows.ts';
import type { Comparison } from './comparable.ts';
import type { Pairable } from './pairings.ts';
import type { StatedName } from './stated.ts';
import type { Asked } from './window-figures.ts';

type Target = RecordNode<'evaluation'>;

/** Two series to compare, and all that their figures depend on. */
export interface Subject {
  readonly basis: Basis;
  readonly asked: Asked;
  /** Reads both series. */
  pairable(): Promise<Statistic<Pairable>>;
}

/** Raised whenever the same files may give another figure. */
export const scoresVersion = 1;

/** What a target's figures are computed from, where its files are named and their content is here. */
export async function subjectOf(
  target: Target,
  stated: readonly StatedName[],
  records: Records,
  snapshot: Snapshot,
): Promise<{ readonly value: Subject } | Unusable> {
  const { observed, simulated } = target.fragment;
  if (observed === undefined) return { undefined: 'no observed input is named', away: null };
  const input = findInput(observed, records);
  if ('undefined' in input) return input;
  const output = await findOutput(simulated ?? {}, records, snapshot);
  if ('undefined' in output) return output;
  const windows = windowsOfTarget(target, records);
  const comparison = comparisonOf(target, records);
  const asked = askedOf(target, stated, records);
  const from = {
    input: input.value.from,
    output: output.value,
    windows: windows.map(({ kind, period }) => ({ kind, period })),
    comparison,
    asked,
  };
  return {
    value: {
      basis: { what: 'scores', version: scoresVersion, from },
      asked,
      async pairable() {
        const seen = await readInputSeries(input.value, records, snapshot);
        if (!isDefined(seen)) return seen;
        const made = await readOutputSeries(output.value, snapshot);
        if (!isDefined(made)) return made;
        return { value: { sides: { observed: seen.value, simulated: made.value }, comparison, windows } };
      },
    },
  };
}

/** Scores that rules judge by, and that are written where a window has none. */
const usual: readonly ScoreName[] = ['nse', 'log_nse', 'rsr', 'pbias', 'r2', 'kge'];

/** The usual scores and those stated; peaks where they are stated or described, or the purpose needs high or all flows. */
function askedOf({ fragment }: Target, stated: readonly StatedName[], { manifest }: Records): Asked {
  const { peaks, variable } = fragment;
  const isNeeded = (manifest.data.study?.needs ?? []).some(
    (need) =>
      (need.variable ?? 'streamflow') === 'streamflow' && (need.regime === 'high' || need.regime === 'whole'),
  );
  const asksForPeaks =
    peaks !== undefined || stated.includes('peaks_hit') || (isNeeded && variable === 'streamflow');
  const scores = stated.filter((name) => name !== 'peaks_hit');
  return { scores: [...new Set([...usual, ...scores])].sort(), peaks: asksForPeaks ? (peaks ?? {}) : null };
}

/** How a target's two series are compared: its step, over the catchment's area and in its years. */
function comparisonOf({ fragment }: Target, { manifest: { data } }: Records): Comparison {
  const areaKm2 = areaKm2Of(data);
  return {
    ...(areaKm2 === null ? {} : { areaKm2 }),
    variable: fragment.variable ?? 'other',
    step: fragment.step === undefined ? null : parseStep(fragment.step),
    yearBegins: yearBeginsOf(data),
  };
}
