import type { Review } from '../manifest/data.generated.ts';
import { sha256OfJson } from '../records/canonical.ts';

/** Of the digest of what a graph of observed and simulated shows (`graph` of the recomputed figures). */
export const graphVersion = 2;

/** Identifies a review: who, when, what was seen. */
export function reviewDigest(review: Review): string {
  return sha256OfJson(review);
}
