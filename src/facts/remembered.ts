import { type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import { sha256OfJson } from '../records/canonical.ts';
import { OfAnotherPart } from '../repository/part.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { version } from '../version.ts';

/** All that a computed value depends on, beside the program that computes it: a release may read the same file otherwise. */
export interface Basis {
  /** What is computed. */
  readonly what: string;
  /** Of the computation; raised whenever it may give another value for the same content. */
  readonly version: number;
  /** Layouts, choices and blob ids of the files; JSON. */
  readonly from: unknown;
}

/**
 * What `compute` gives, computed once for the same basis and kept between runs; a value that JSON can say. It asks for no
 * other remembered value: in a run that does a part of the work, what another part works out is undefined.
 */
export async function remembered<T>(
  snapshot: Snapshot,
  basis: Basis,
  compute: () => Promise<Statistic<T>>,
): Promise<Statistic<T>> {
  try {
    return await snapshot.remember(sha256OfJson({ ...basis, program: version }), compute);
  } catch (error) {
    if (error instanceof OfAnotherPart) return undefinedBecause('another part of the run works it out');
    throw error;
  }
}
