import { uuidOf } from '../identifier.ts';

/** A UUID made from texts: names and digests, so that the same thing has the same identifier in every document. */
export function idOf(...texts: readonly string[]): string {
  return uuidOf(JSON.stringify(texts));
}
