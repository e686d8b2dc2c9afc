import { isDefined, type Statistic } from '../../hydrology/paired.ts';
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
import type { PeakSettings } from './window-figures.ts';

type Target = RecordNode<'evaluation'>;

/** What a target's figures are computed from, and all that they depend on. */
export interface Subject {
  readonly basis: Basis;
  readonly peaks: PeakSettings | undefined;
  /** Reads both series. */
  pairable(): Promise<Statistic<Pairable>>;
}

/** Raised whenever the same files may give another figure. */
export const scoresVersion = 1;

export async function subjectOf(
  target: Target,
  records: Records,
  snapshot: Snapshot,
): Promise<{ readonly value: Subject } | Unusable> {
  const { fragment } = target;
  const { observed, simulated, peaks } = fragment;
  if (observed === undefined) return { undefined: 'no observed input is named', isAway: false };
  const input = findInput(observed, records);
  if ('undefined' in input) return input;
  const output = await findOutput(simulated ?? {}, records, snapshot);
  if ('undefined' in output) return output;
  const windows = windowsOfTarget(target, records);
  const comparison = comparisonOf(target, records);
  const from = {
    input: input.value.from,
    output: output.value,
    windows: windows.map(({ kind, period }) => ({ kind, period })),
    comparison,
    peaks,
  };
  return {
    value: {
      basis: { what: 'scores', version: scoresVersion, from },
      peaks,
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
