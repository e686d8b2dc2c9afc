import { defined, isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import { scores as statistics } from '../hydrology/scores.ts';
import type { RecordNode, Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { Away } from './input.ts';
import { nodesIn } from './nodes-in.ts';
import { remembered } from './remembered.ts';
import { type Cause, causesVersion, fits, likelyCauses } from './scores/causes.ts';
import { type RecomputedFigures, recompute } from './scores/recompute.ts';
import {
  type ScoredWindow,
  type StatedName,
  type StatedScore,
  scoredWindows,
  scoresInManifest,
  scoresInTable,
  type UnreadRow,
} from './scores/stated.ts';
import { subjectOf } from './scores/subject.ts';

/** How well one target fits: what its files give, and what is stated. */
export interface TargetFigures {
  /** The record's id. */
  readonly record: string;
  /** Undefined where the files can't be compared. */
  readonly recomputed: Statistic<RecomputedFigures>;
  /** Where a file's content is not here, so that nothing can be said: why. */
  readonly away: Away | null;
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

const known: ReadonlySet<string> = new Set([...Object.keys(statistics), 'peaks_hit']);

/** By the name of the target: its figures. Those of unchanged files and windows are remembered; only files of others are read. */
export async function scoresOf(
  records: Records,
  snapshot: Snapshot,
): Promise<ReadonlyMap<string, TargetFigures>> {
  const figures = new Map<string, TargetFigures>();
  // One after the other: each may hold two long series.
  for (const target of nodesIn(records.nodes, 'evaluation'))
    if (target.name !== null && target.fragment.none_because === undefined)
      figures.set(target.name, await figuresOf(target, records, snapshot));
  return figures;
}

async function figuresOf(
  target: RecordNode<'evaluation'>,
  records: Records,
  snapshot: Snapshot,
): Promise<TargetFigures> {
  const { manifest } = records;
  const inTable = await scoresInTable(target, known, manifest, snapshot);
  const stated = [...scoresInManifest(target, manifest), ...inTable.stated];
  const names = stated.map(({ score }) => score);
  const subject = await subjectOf(target, names, records, snapshot);
  const { unread } = inTable;
  const of = { record: target.id, unread };
  if ('undefined' in subject) {
    const failed = stated.map((score) => ({ ...score, recomputed: subject, agrees: false, causes: [] }));
    return { ...of, recomputed: subject, away: subject.away, stated: failed };
  }
  const { basis, pairable, asked } = subject.value;
  const recomputed = await remembered(snapshot, basis, async () => {
    const read = await pairable();
    return isDefined(read) ? recompute(read.value, asked) : read;
  });
  const compared = stated.map((score) => {
    const figure = recomputedScore(recomputed, score.window, score.score);
    return { score, figure, agrees: fits(score, figure) };
  });
  const causes = new Map<StatedScore, readonly Cause[]>();
  for (const window of scoredWindows) {
    const here = compared.filter(({ score }) => score.window === window);
    const differing = here.filter(({ agrees, figure }) => !agrees && isDefined(figure));
    if (differing.length === 0) continue;
    const from = { basis, window, stated: here.map(({ score: { score, printed } }) => [score, printed]) };
    const found = await remembered(snapshot, { what: 'causes', version: causesVersion, from }, async () => {
      const read = await pairable();
      if (!isDefined(read)) return read;
      const scores = (some: typeof here) => some.map(({ score }) => score);
      const likely = likelyCauses(read.value, window, scores(here), scores(differing));
      return defined(here.map(({ score }) => likely.get(score) ?? []));
    });
    if (isDefined(found))
      for (const [place, { score }] of here.entries()) causes.set(score, found.value[place] ?? []);
  }
  return {
    ...of,
    recomputed,
    away: null,
    stated: compared.map(({ score, figure, agrees }) => ({
      ...score,
      recomputed: figure,
      agrees,
      causes: causes.get(score) ?? [],
    })),
  };
}

/** The recomputed figure of a score over a window, or why there is none. */
export function recomputedScore(
  recomputed: Statistic<RecomputedFigures>,
  window: ScoredWindow,
  score: StatedName,
): Statistic {
  if (!isDefined(recomputed)) return recomputed;
  const figures = recomputed.value.windows[window] ?? undefinedBecause(`no ${window} window is stated`);
  if (!isDefined(figures)) return figures;
  if (score !== 'peaks_hit') return figures.value.scores[score] ?? undefinedBecause('nobody asks for it');
  const { peaks } = figures.value;
  if (!isDefined(peaks)) return peaks;
  if (!peaks.value.stated) return undefinedBecause('nothing says what counts as a peak (`peaks.above`)');
  return peaks.value.share;
}
