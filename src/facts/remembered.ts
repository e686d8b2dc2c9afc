import { sha256OfJson } from '../records/canonical.ts';
import type { Snapshot } from '../repository/snapshot.ts';

/** All that a computed value depends on. */
export interface Basis {
  /** What is computed. */
  readonly what: string;
  /** Of the computation; raised whenever it may give another value for the same content. */
  readonly version: number;
  /** Layouts, choices and SHA-256 of the files; JSON. */
  readonly from: unknown;
}

/** What `compute` gives, computed once for the same basis and kept between runs; a value that JSON can say. */
export function remembered<T>(snapshot: Snapshot, basis: Basis, compute: () => Promise<T>): Promise<T> {
  return snapshot.remember(sha256OfJson(basis), compute);
}
