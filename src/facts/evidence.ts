import type { EvaluationTarget } from '../manifest/data.generated.ts';
import type { Evidence } from '../records/make-seals.ts';
import type { Records } from '../records/record.ts';
import type { Standing } from '../records/seal.ts';
import { reviewDigest, seenSeriesDigest } from './seen-series.ts';

/** By record: what a seal made now should keep of what was computed. */
export function evidenceFor(
  records: Records,
  standings: ReadonlyMap<string, Standing>,
): ReadonlyMap<string, Evidence> {
  const evidence = new Map<string, Evidence>();
  for (const [id, { area, fragment }] of records.nodes) {
    if (area !== 'evaluation') continue;
    const seen = seenOnGraph(fragment as EvaluationTarget, standings.get(id), records);
    evidence.set(id, { facts: seen, grade: 'sealed' });
  }
  return evidence;
}

/** Which series the review of a target is about: those of now for a new review, else those that it was first sealed with. */
function seenOnGraph(
  target: EvaluationTarget,
  standing: Standing | undefined,
  records: Records,
): Evidence['facts'] {
  if (target.review === undefined) return {};
  const review = { value: reviewDigest(target.review), computed_by: 1 };
  const sealed = standing?.seal?.facts;
  const sameReview = sealed?.review?.value === review.value;
  const now = { value: seenSeriesDigest(target, records), computed_by: 1 };
  return { review, series_seen: (sameReview ? sealed?.series_seen : undefined) ?? now };
}
