import { areaKm2Of } from '../../facts/catchment.ts';
import type { Facts } from '../../facts/facts.ts';
import { findOutput, readOutput } from '../../facts/output.ts';
import { comparable } from '../../facts/scores/comparable.ts';
import { daysOf, pairedOver, pairsOf, simulatedDays } from '../../facts/scores/pairings.ts';
import { subjectOf } from '../../facts/scores/subject.ts';
import { defined, isDefined, type Paired, type Statistic } from '../../hydrology/paired.ts';
import type { RecordNode } from '../../records/record.ts';
import type { Snapshot } from '../../repository/snapshot.ts';
import { secondsOfDay } from '../../series/calendar.ts';
import { convertSeries } from '../../series/convert-series.ts';
import type { Series } from '../../series/series.ts';
import type { Step } from '../../series/step.ts';
import type { OverTime } from '../charts/hydrograph.ts';
import type { Line } from '../charts/thin.ts';

/** The series of one target, as its figures are drawn from; in the unit of the observations. */
export interface TargetSeries {
  readonly unit: string;
  readonly overTime: OverTime;
  /** Pairs of the windows, warm-up kept out; null where a window is not stated or has no pairs. */
  readonly calibration: Paired | null;
  readonly validation: Paired | null;
  /** Both windows; all pairs of the simulation where no window is stated. */
  readonly all: Paired | null;
}

/** Undefined where a file's content is not here, or the two series can't be compared. */
export async function targetSeries(
  target: RecordNode<'evaluation'>,
  { records, bands }: Facts,
  snapshot: Snapshot,
): Promise<Statistic<TargetSeries>> {
  const subject = await subjectOf(target, [], records, snapshot);
  if ('undefined' in subject) return { undefined: subject.undefined };
  const pairable = await subject.value.pairable();
  if (!isDefined(pairable)) return pairable;
  const sides = comparable(pairable.value.sides, pairable.value.comparison);
  if (!isDefined(sides)) return sides;
  const { observed, simulated } = sides.value;
  const over = (window: 'calibration' | 'validation') => pairsIn(pairsOf(pairable.value, window));
  const [calibration, validation] = [over('calibration'), over('validation')];
  const { windows } = pairable.value;
  const stated = [...daysOf(windows, 'calibration'), ...daysOf(windows, 'validation')];
  const days = stated.length === 0 ? simulatedDays(sides.value) : stated;
  const band = bands.find((one) => one.target === target.name);
  const longestStep = longestStepOf(simulated.step);
  const lines =
    band === undefined
      ? null
      : await bandLines(band.fragment, observed.unit, areaKm2Of(records.manifest.data), records, snapshot);
  return defined({
    unit: observed.unit,
    overTime: { observed: lineOf(observed), simulated: lineOf(simulated), band: lines, longestStep },
    calibration,
    validation,
    all: pairsIn(pairedOver(pairable.value, days, daysOf(windows, 'warm-up'))),
  });
}

function pairsIn(paired: Statistic<Paired>): Paired | null {
  return isDefined(paired) && paired.value.observed.length > 0 ? paired.value : null;
}

function lineOf({ timeSeconds, values }: Series): Line {
  return { x: timeSeconds.map((time) => time / secondsOfDay), y: values };
}

/** One step, with some room for months of different length; samples are joined whatever lies between. */
function longestStepOf(step: Step): number {
  if (step.kind === 'irregular') return Number.POSITIVE_INFINITY;
  return step.kind === 'months' ? step.length * 31.5 : (step.length * 1.5) / secondsOfDay;
}

/** Both ends in the unit of the observations; null where they can't be read or converted. */
async function bandLines(
  { lower, upper, ...layout }: Facts['bands'][number]['fragment'],
  unit: string,
  areaKm2: number | null,
  records: Facts['records'],
  snapshot: Snapshot,
): Promise<OverTime['band']> {
  if (lower === undefined || upper === undefined) return null;
  const output = await findOutput({ ...layout, values: [lower, upper] }, records, snapshot);
  if ('undefined' in output) return null;
  const columns = await readOutput(output.value, snapshot);
  if (!isDefined(columns)) return null;
  const [low, high] = [...columns.value.values()].map((series) =>
    convertSeries(series, unit, areaKm2 === null ? {} : { areaKm2 }),
  );
  if (low === undefined || high === undefined || !isDefined(low) || !isDefined(high)) return null;
  return { x: lineOf(low.value).x, lower: low.value.values, upper: high.value.values };
}
