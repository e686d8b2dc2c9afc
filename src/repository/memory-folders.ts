import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { type Part, parsePart, partName } from './part.ts';

/** Where a run finds what other runs found out. */
export interface MemoryFolders {
  /** Looked up first, and where this run keeps what is not there yet. */
  readonly own: string;
  readonly others: readonly string[];
}

/** How a run shares its work: it does one part of it for others, or takes in what the parts did. */
export type Sharing = Part | 'gather';

/** The folders of a repository's memory below its common git directory. */
export async function memoryFolders(
  commonDirectory: string,
  sharing: Sharing | undefined,
): Promise<MemoryFolders> {
  const usual = join(commonDirectory, 'stoplog');
  if (sharing === undefined) return { own: usual, others: [] };
  if (sharing === 'gather') {
    const parts = await partsIn(commonDirectory);
    return { own: usual, others: parts.map((part) => partFolder(commonDirectory, part)) };
  }
  return { own: partFolder(commonDirectory, sharing), others: [usual] };
}

/** Where a part leaves its work. */
export function partFolder(commonDirectory: string, part: Part): string {
  return join(commonDirectory, 'stoplog', 'parts', partName(part));
}

/** The parts that have left their work, in order. */
export async function partsIn(commonDirectory: string): Promise<readonly Part[]> {
  const names = await readdir(join(commonDirectory, 'stoplog', 'parts')).catch(() => []);
  return names.flatMap((name) => parsePart(name) ?? []).sort((a, b) => a.of - b.of || a.number - b.number);
}
