import { type DigestMemory, forgetfulMemory, openDigestMemory } from './digest-memory.ts';
import { memoryFolders, type Sharing } from './memory-folders.ts';
import type { Part } from './part.ts';
import type { Repository } from './repository.ts';
import { forgetfulValues, openValueMemory, type ValueMemory } from './value-memory.ts';

/** What one run knows of content, in whatever states of the repository it meets it. */
export interface Memories {
  readonly digests: DigestMemory;
  readonly values: ValueMemory;
  /** The share of the work that this run does; without it, all. */
  readonly part?: Part | undefined;
  /** Blobs that other parts are to read, with their bytes. */
  readonly left: Map<string, number>;
}

export interface Remembering {
  /** False to hash and compute everything anew and keep nothing under the git directory. */
  readonly remember?: boolean | undefined;
  /** How the work is shared with other runs, by what is kept; without it this run does all of it. */
  readonly sharing?: Sharing | undefined;
  /** Told how far long work has come. */
  readonly progress?: ((text: string) => void) | undefined;
}

/** Opens what earlier runs, and the parts of this one, kept below the common git directory. */
export async function openMemories(
  { commonDirectory }: Pick<Repository, 'commonDirectory'>,
  { remember = true, sharing, progress }: Remembering,
): Promise<Memories> {
  const left = new Map<string, number>();
  if (!remember) return { digests: forgetfulMemory(), values: forgetfulValues(progress), left };
  const part = sharing === 'gather' ? undefined : sharing;
  const folders = await memoryFolders(commonDirectory, sharing);
  return {
    digests: await openDigestMemory(folders),
    values: openValueMemory(folders, { part, progress }),
    part,
    left,
  };
}
