import type { Reference } from './names.ts';
import { restsOnFirst } from './rests-on.ts';
import type { Stated, Statement } from './statements.ts';

/**
 * How digests are made. A later Stoplog that finds another dependence adds a scheme here and keeps this one: seals
 * made by it are judged by it, so that an upgrade never makes a repository stale overnight.
 */
export interface Scheme {
  /** Counted from 1, in the list's order. */
  readonly number: number;
  readonly restsOn: (statement: Statement, stated: Stated) => readonly Reference[];
}

/** Oldest first; never empty. */
export type Schemes = readonly [Scheme, ...Scheme[]];

export const schemes: Schemes = [{ number: 1, restsOn: restsOnFirst }];

/** The one that new seals are made by. */
export function newest(list: Schemes): Scheme {
  return list.at(-1) ?? list[0];
}
