import { isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import { scores as known } from '../hydrology/scores.ts';
import type { RecordNode, Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { calendarYears, parseYearBegins } from '../series/hydrological-year.ts';
import { parseStep } from '../series/step.ts';
import { conversion } from '../series/units/conversion.ts';
import { findInput, readInputSeries } from './input.ts';
import { findOutput, readOutputSeries } from './output.ts';
import { type Basis, remembered } from './remembered.ts';
import { type Cause, fits, likelyCauses } from './scores/causes.ts';
import type { Comparison } from './scores/comparable.ts';
import type { Pairable } from './scores/pairings.ts';
import { type RecomputedFigures, recompute } from './scores/recompute.ts';
import {
  type StatedScore,
  scoredWindows,
  scoresInManifest,
  scoresInTable,
  type UnreadRow,
} from './scores/stated.ts';
import type { PeakSettings } from './scores/window-figures.ts';
import { targetsIn, windowsOfTarget } from './windows.ts';

/** How well one target fits: what its files give, and what is stated. */
export interface TargetFigures {
  /** The record's id. */
  readonly record: string;
  /** Undefined where the files can't be compared. */
  readonly recomputed: Statistic<RecomputedFigures>;
  /** False where a file's content is not here, so that nothing can be said. */
  readonly isHere: boolean;
  readonly stated: readonly ComparedScore[];
  /** Rows of its score table that hold no score. */
  readonly unread: readonly UnreadRow[];
}

export interface ComparedScore extends StatedScore {
  readonly recomputed: Statistic;
  readonly agrees: boolean;
  /** Mix-ups that give just the stated figure; empty where it agrees, or none does. */
  readonly causes: readonly Cause[];
}

/** Raised whenever the same files may give another figure. */
export const scoresVersion = 1;

const names: ReadonlySet<string> = new Set([...Object.keys(known), 'peaks_hit']);

/** By the name of the target: its figures. Those of unchanged files and windows are remembered; only files of others are read. */
export async function scoresOf(
  records: Records,
  snapshot: Snapshot,
): Promise<ReadonlyMap<string, TargetFigures>> {
  const figures = new Map<string, TargetFigures>();
  // One after the other: each may hold two long series.
  for (const target of targetsIn(records.nodes))
    if (target.name !== null && target.fragment.none_because === undefined)
      figures.set(target.name, await figuresOf(target, records, snapshot));
  return figures;
}

type Target = RecordNode<'evaluation'>;

async function figuresOf(target: Target, records: Records, snapshot: Snapshot): Promise<TargetFigures> {
  const { manifest } = records;
  const inTable = await scoresInTable(target, names, manifest, snapshot);
  const stated = [...scoresInManifest(target, manifest), ...inTable.stated];
  const subject = await subjectOf(target, records, snapshot);
  const { unread } = inTable;
  const of = { record: target.id, unread };
  if (!isDefined(subject)) {
    const failed = stated.map((score) => ({ ...score, recomputed: subject, agrees: false, causes: [] }));
    return { ...of, recomputed: subject, isHere: false, stated: failed };
  }
  const { basis, pairable, peaks } = subject.value;
  const recomputed = await remembered(snapshot, basis, async () => {
    const read = await pairable();
    return isDefined(read) ? recompute(read.value, peaks) : read;
  });
  const compared = stated.map((score) => {
    const figure = figureOf(score, recomputed, peaks);
    return { score, figure, agrees: fits(score, figure) };
  });
  const causes = new Map<StatedScore, readonly Cause[]>();
  for (const window of scoredWindows) {
    const here = compared.filter(({ score }) => score.window === window);
    const differing = here.filter(({ agrees, figure }) => !agrees && isDefined(figure));
    const read = differing.length > 0 ? await pairable() : null;
    if (read === null || !isDefined(read)) continue;
    const scores = (some: typeof here) => some.map(({ score }) => score);
    for (const [score, found] of likelyCauses(read.value, window, scores(here), scores(differing)))
      causes.set(score, found);
  }
  return {
    ...of,
    recomputed,
    isHere: true,
    stated: compared.map(({ score, figure, agrees }) => ({
      ...score,
      recomputed: figure,
      agrees,
      causes: causes.get(score) ?? [],
    })),
  };
}

/** The recomputed figure of a stated score, or why there is none. */
function figureOf(
  { window, score }: StatedScore,
  recomputed: Statistic<RecomputedFigures>,
  peaks: PeakSettings | undefined,
): Statistic {
  if (!isDefined(recomputed)) return recomputed;
  const figures = recomputed.value.windows[window] ?? undefinedBecause(`no ${window} window is stated`);
  if (!isDefined(figures)) return figures;
  if (score !== 'peaks_hit') return figures.value.scores[score];
  if (peaks?.above === undefined)
    return undefinedBecause('nothing says what counts as a peak (`peaks.above`)');
  return isDefined(figures.value.peaks) ? figures.value.peaks.value.share : figures.value.peaks;
}

/** What a target's figures are computed from, and all that they depend on. */
interface Subject {
  readonly basis: Basis;
  readonly peaks: PeakSettings | undefined;
  /** Reads both series. */
  pairable(): Promise<Statistic<Pairable>>;
}

/** Undefined where a file is not named, or its content is not here. */
async function subjectOf(target: Target, records: Records, snapshot: Snapshot): Promise<Statistic<Subject>> {
  const { fragment } = target;
  const { observed, simulated, peaks } = fragment;
  if (observed === undefined) return undefinedBecause('no observed input is named');
  const input = findInput(observed, records);
  if (!isDefined(input)) return input;
  const output = await findOutput(simulated ?? {}, records, snapshot);
  if (!isDefined(output)) return output;
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
  const { area } = data.catchment ?? {};
  const toKm2 = area === undefined ? null : conversion({ from: area.unit, to: 'km2' });
  const areaKm2 =
    area !== undefined && toKm2 !== null && isDefined(toKm2) ? area.value * toKm2.value.factor : null;
  return {
    ...(areaKm2 === null ? {} : { areaKm2 }),
    variable: fragment.variable ?? 'other',
    step: fragment.step === undefined ? null : parseStep(fragment.step),
    yearBegins: parseYearBegins(data.periods?.year_begins ?? '') ?? calendarYears,
  };
}
