import { defined, isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import type { Band } from '../manifest/data.generated.ts';
import type { FieldPath } from '../manifest/manifest.ts';
import type { RecordNode, Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { Series } from '../series/series.ts';
import { formatTime } from '../series/step.ts';
import { type BandOver, bandOver, crossings } from './bands/band-over.ts';
import { areaKm2Of, yearBeginsOf } from './catchment.ts';
import type { Figure } from './figures.ts';
import { type Away, findInput, readInputSeries, type Unusable } from './input.ts';
import { findOutput, readOutput, readOutputSeries } from './output.ts';
import { type Days, daysOver } from './over.ts';
import { remembered } from './remembered.ts';
import { type Comparison, inUnitAndStep } from './scores/comparable.ts';
import { type ComparedFigure, compareFigures, figuresOf, withWindows } from './stated-figure.ts';
import { runOf, windowsOfTarget } from './windows.ts';

/** What a band's files give. */
export interface RecomputedBand {
  /** Steps on which the band is upside down, and the first of them. */
  readonly crossed: { readonly steps: number; readonly first: string };
  /** Over the window that the record names. */
  readonly stated: Statistic<BandOver>;
  readonly calibration: Statistic<BandOver>;
  readonly validation: Statistic<BandOver>;
  /** Share of the simulated series of its own target that the band holds, over the same window. */
  readonly holdsSimulated: Statistic;
}

/** The uncertainty band of one target. */
export interface BandFigures {
  /** The name of the target. */
  readonly target: string;
  readonly field: FieldPath;
  readonly fragment: Band;
  /** What the target observes. */
  readonly variable: string;
  /** `validation` unless the record says otherwise. */
  readonly over: string;
  readonly recomputed: Statistic<RecomputedBand>;
  /** Where a file's content is not here, so that nothing can be said: why. */
  readonly away: Away | null;
  readonly stated: readonly ComparedFigure[];
}

/** Raised whenever the same files may give another figure. */
export const bandsVersion = 1;

/** Every band of the manifest, in its order. */
export async function bandsOf(records: Records, snapshot: Snapshot): Promise<readonly BandFigures[]> {
  const found: BandFigures[] = [];
  for (const [target, band] of Object.entries(records.manifest.data.uncertainty?.bands ?? {}))
    found.push(await figuresOfBand(target, band, records, snapshot));
  return found;
}

async function figuresOfBand(
  target: string,
  fragment: Band,
  records: Records,
  snapshot: Snapshot,
): Promise<BandFigures> {
  const field = ['uncertainty', 'bands', target];
  const record = records.nodes.get(`evaluation.${target}`) as RecordNode<'evaluation'> | undefined;
  const over = fragment.over ?? 'validation';
  const subject = await subjectOf(fragment, over, record, records, snapshot);
  const recomputed: Statistic<RecomputedBand> = isUnusable(subject)
    ? { undefined: subject.undefined }
    : await remembered(snapshot, { what: 'band', version: bandsVersion, from: subject.value.from }, () =>
        recompute(subject.value, records, snapshot),
      );
  const found = isDefined(recomputed) ? overWindow(recomputed.value.stated) : recomputed;
  const stated = compareFigures(fragment.stated, [...field, 'stated'], found, records.manifest);
  const elsewhere = new Map(
    (['calibration', 'validation'] as const).flatMap((window) => {
      const there = isDefined(recomputed) ? overWindow(recomputed.value[window]) : recomputed;
      return there instanceof Map ? [[window, there] as const] : [];
    }),
  );
  return {
    target,
    field,
    fragment,
    variable: record?.fragment.variable ?? 'other',
    over,
    recomputed,
    away: isUnusable(subject) ? subject.away : null,
    stated: withWindows(stated, elsewhere),
  };
}

function isUnusable<T>(subject: { readonly value: T } | Unusable): subject is Unusable {
  return 'undefined' in subject;
}

/** What a record may state of a band, by the same names. */
function overWindow(
  over: Statistic<BandOver>,
): ReadonlyMap<string, Statistic> | { readonly undefined: string } {
  if (!isDefined(over)) return over;
  const { coverage, relativeWidth, intervalScore } = over.value;
  return new Map([
    ['coverage', coverage],
    ['relative_width', relativeWidth],
    ['interval_score', intervalScore],
  ]);
}

interface Subject {
  /** All that the figures depend on; JSON. */
  readonly from: object;
  readonly fragment: Band;
  readonly target: RecordNode<'evaluation'>;
  readonly windows: Readonly<Record<'stated' | 'calibration' | 'validation', Statistic<Days>>>;
}

async function subjectOf(
  fragment: Band,
  over: string,
  target: RecordNode<'evaluation'> | undefined,
  records: Records,
  snapshot: Snapshot,
): Promise<{ readonly value: Subject } | Unusable> {
  const { data } = records.manifest;
  const observed = target?.fragment.observed;
  if (target === undefined || observed === undefined)
    return { undefined: 'its target names no observed input', away: null };
  const input = findInput(observed, records);
  if (isUnusable(input)) return input;
  const output = await findOutput(endsOf(fragment), records, snapshot);
  if (isUnusable(output)) return output;
  const simulated = await findOutput(target.fragment.simulated ?? {}, records, snapshot);
  const stated = windowsOfTarget(target, records);
  const daysOf = (window: string) => daysOver(window, runOf(target, records.nodes), stated, data);
  const windows = {
    stated: daysOf(over),
    calibration: daysOf('calibration'),
    validation: daysOf('validation'),
  };
  const from = {
    input: input.value.from,
    output: output.value,
    simulated: isUnusable(simulated) ? simulated : simulated.value,
    level: fragment.level,
    variable: target.fragment.variable,
    areaKm2: areaKm2Of(data),
    yearBegins: yearBeginsOf(data),
    windows,
  };
  return defined({ from, fragment, target, windows });
}

function endsOf({ lower, upper, ...layout }: Band) {
  const values = [lower, upper].filter((column) => column !== undefined);
  return { ...layout, ...(values.length === 0 ? {} : { values }) };
}

async function recompute(
  { fragment, target, windows }: Subject,
  records: Records,
  snapshot: Snapshot,
): Promise<Statistic<RecomputedBand>> {
  const { data } = records.manifest;
  const output = await findOutput(endsOf(fragment), records, snapshot);
  if (isUnusable(output)) return output;
  const read = await readOutput(output.value, snapshot);
  if (!isDefined(read)) return read;
  const [lower, upper, ...more] = [...read.value.values()];
  if (lower === undefined || upper === undefined || more.length > 0)
    return undefinedBecause('it does not name two columns, `lower` and `upper`');
  const yearBegins = yearBeginsOf(data);
  const areaKm2 = areaKm2Of(data);
  const comparison: Comparison = {
    variable: target.fragment.variable ?? 'other',
    step: lower.step,
    yearBegins,
    ...(areaKm2 === null ? {} : { areaKm2 }),
  };
  /** A series in the band's unit and step. */
  const beside = (series: Series): Statistic<Series> =>
    inUnitAndStep(series, lower.unit, lower.step, comparison);
  const input = findInput(target.fragment.observed ?? { input: '' }, records);
  if (isUnusable(input)) return input;
  const seen = await readInputSeries(input.value, records, snapshot);
  const observed = isDefined(seen) ? beside(seen.value) : seen;
  if (!isDefined(observed)) return undefinedBecause(`the observed series: ${observed.undefined}`);
  const over = (series: Series, days: Statistic<Days>): Statistic<BandOver> =>
    isDefined(days) ? bandOver(series, { lower, upper }, fragment.level, days.value, yearBegins) : days;
  const { steps, firstSeconds } = crossings({ lower, upper });
  const made = await findOutput(target.fragment.simulated ?? {}, records, snapshot);
  const series = isUnusable(made) ? made : await readOutputSeries(made.value, snapshot);
  const simulated = 'undefined' in series ? series : beside(series.value);
  const own = isDefined(simulated) ? over(simulated.value, windows.stated) : simulated;
  return defined({
    crossed: { steps, first: formatTime(firstSeconds, lower.step) },
    stated: over(observed.value, windows.stated),
    calibration: over(observed.value, windows.calibration),
    validation: over(observed.value, windows.validation),
    holdsSimulated: isDefined(own) ? own.value.coverage : { undefined: own.undefined },
  });
}

/** What is written for a band that states nothing, with its decimals. */
const usual = { coverage: 2, relative_width: 2 };

/** Figures of bands that the files give otherwise, and those of bands that state none. */
export function bandFiguresToWrite({
  records,
  bands,
}: {
  readonly records: Records;
  readonly bands: readonly BandFigures[];
}): readonly Figure[] {
  const record = records.nodes.get('uncertainty');
  if (record === undefined) return [];
  return bands.flatMap(({ field, stated, recomputed }) => {
    const found = isDefined(recomputed) ? overWindow(recomputed.value.stated) : recomputed;
    return found instanceof Map ? figuresOf(record, [...field, 'stated'], stated, found, usual) : [];
  });
}
