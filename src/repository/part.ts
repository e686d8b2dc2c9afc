import type { Blobs } from './blobs.ts';
import { pointerBytesBelow } from './pointer.ts';

/** One of several runs that share the work on one state of a repository. */
export interface Part {
  /** From 1. */
  readonly number: number;
  readonly of: number;
}

/** More would each have less to do than it costs to start them. */
const mostParts = 256;

/** Reads `2of8`; null where it is no such thing. */
export function parsePart(text: string): Part | null {
  const [, number, of] = /^([1-9]\d{0,2})of([1-9]\d{0,2})$/.exec(text)?.map(Number) ?? [];
  if (number === undefined || of === undefined || number > of || of > mostParts) return null;
  return { number, of };
}

/** As `parsePart` reads it. */
export function partName({ number, of }: Part): string {
  return `${number}of${of}`;
}

/** Thrown for a value that another part works out. */
export class OfAnotherPart extends Error {}

/** Whether a value is this part's to work out, by its key (hexadecimal, evenly spread). */
export function isKeyOfPart(key: string, { number, of }: Part): boolean {
  return Number.parseInt(key.slice(0, 12), 16) % of === number - 1;
}

/**
 * The blobs, of those asked about, whose content this part leaves to others to read, with their bytes. Small ones are
 * left to nobody: only reading tells whether one is a Git LFS pointer.
 */
export async function blobsOfOthers(
  ids: readonly string[],
  part: Part,
  blobs: Pick<Blobs, 'sizes'>,
): Promise<ReadonlyMap<string, number>> {
  const sizes = await blobs.sizes(ids);
  const own = blobsOfPart(sizes, part);
  return new Map([...sizes].filter(([id, bytes]) => bytes >= pointerBytesBelow && !own.has(id)));
}

/** The largest blob first goes to the part that has least so far, so that all come out alike; whoever knows the sizes finds the same. */
export function blobsOfPart(sizes: ReadonlyMap<string, number>, { number, of }: Part): ReadonlySet<string> {
  const loads = new Array<number>(of).fill(0);
  const own = new Set<string>();
  for (const [id, bytes] of [...sizes].sort(([a, x], [b, y]) => y - x || (a < b ? -1 : 1))) {
    const least = loads.indexOf(Math.min(...loads));
    loads[least] = (loads[least] ?? 0) + bytes;
    if (least === number - 1) own.add(id);
  }
  return own;
}
