import type { EvaluationTarget, Review } from '../manifest/data.generated.ts';
import { sha256OfJson } from '../records/canonical.ts';
import type { Records } from '../records/record.ts';

/** Identifies what a reviewer saw on the graph of a target: SHA-256 over the digests of its observed and simulated files. */
export function seenSeriesDigest(target: EvaluationTarget, records: Records): string {
  const { observed, simulated } = target;
  const digestsOf = (record: string, file: string | undefined): Record<string, string | null> =>
    Object.fromEntries(
      [...(records.nodes.get(record)?.claims.values() ?? [])]
        .filter((claim) => claim.own && (file === undefined || claim.path.endsWith(file)))
        .map(({ path, identity }) => [path, identity.kind === 'unavailable' ? null : identity.sha256]),
    );
  return sha256OfJson({
    observed: digestsOf(`inputs.${observed?.input ?? ''}`, observed?.file),
    simulated: digestsOf(`runs.${simulated?.run ?? ''}`, simulated?.file),
  });
}

/** Identifies a review: who, when, what was seen. */
export function reviewDigest(review: Review): string {
  return sha256OfJson(review);
}
