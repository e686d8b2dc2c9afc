import { join } from 'node:path';
import { loadLines, saveLines } from './kept-lines.ts';
import type { MemoryFolders } from './memory-folders.ts';
import { isKeyOfPart, OfAnotherPart, type Part } from './part.ts';
import type { Snapshot } from './snapshot.ts';

/** Values by key, kept between runs so that unchanged content is not read again. */
export interface ValueMemory {
  readonly remember: Snapshot['remember'];
  /** Keeps what is new. A folder that cannot be written is no fault: the memory is disposable. */
  save(): Promise<void>;
}

/** How values are computed. */
interface Computing {
  /** The share of the values that this run computes; without it, all. */
  readonly part?: Part | undefined;
  /** Told how far it has come. */
  readonly progress?: ((text: string) => void) | undefined;
}

const firstLine = 'stoplog values 1';
/** Above this those go that were not asked for longest. */
const mostCharacters = 16 * 2 ** 20;

/**
 * The memory of a repository: the file `values` in each of the folders, read when first asked. A run that does a part of
 * the work computes what is its own, and throws OfAnotherPart for what is neither that nor kept.
 */
export function openValueMemory({ own, others }: MemoryFolders, computing: Computing = {}): ValueMemory {
  const [file, ...more] = [own, ...others].map((folder) => join(folder, 'values')) as [string, ...string[]];
  const load = (from: string) => loadLines(from, firstLine).then(textsFromLines);
  const { remember, asked, fresh } = valuesOver(() => Promise.all([file, ...more].map(load)), computing);
  return {
    remember,
    async save() {
      if (fresh.size === 0) return;
      // Another run may have saved meanwhile; what it computed is as true as ours.
      const all = await load(file);
      for (const key of asked) {
        const text = fresh.get(key) ?? all.get(key);
        all.delete(key);
        if (text !== undefined) all.set(key, text);
      }
      await saveLines(file, firstLine, newestLines(all));
      fresh.clear();
    },
  };
}

/** A memory that forgets at the end of the run. */
export function forgetfulValues(progress?: Computing['progress']): ValueMemory {
  const { remember } = valuesOver(async () => [], { progress });
  return { remember, save: async () => {} };
}

/**
 * The values of one run over those kept before, in its own folder and in others; `fresh` holds the JSON of those that are
 * to be kept in its own, `asked` the keys in order.
 */
function valuesOver(
  load: () => Promise<readonly ReadonlyMap<string, string>[]>,
  { part, progress = () => {} }: Computing,
) {
  let count = 0;
  const inRun = new Map<string, Promise<unknown>>();
  const fresh = new Map<string, string>();
  let kept: Promise<readonly ReadonlyMap<string, string>[]> | undefined;
  async function answer(key: string, compute: () => Promise<unknown>): Promise<unknown> {
    kept ??= load();
    const [own, ...others] = await kept;
    let text = own?.get(key);
    if (text === undefined) {
      text = others.find((one) => one.has(key))?.get(key) ?? (await computed(key, compute));
      fresh.set(key, text);
    }
    return JSON.parse(text);
  }
  async function computed(key: string, compute: () => Promise<unknown>): Promise<string> {
    if (part !== undefined && !isKeyOfPart(key, part)) throw new OfAnotherPart();
    progress(`working out figures: ${count++} done`);
    return JSON.stringify((await compute()) ?? null);
  }
  return {
    fresh,
    asked: { [Symbol.iterator]: () => inRun.keys() } as Iterable<string>,
    remember<T>(key: string, compute: () => Promise<T>): Promise<T> {
      let value = inRun.get(key);
      if (value === undefined) {
        value = answer(key, compute);
        inRun.set(key, value);
      }
      return value as Promise<T>;
    },
  };
}

/** Each line a key, a blank and JSON, which has no line breaks. */
function textsFromLines(lines: readonly string[]): Map<string, string> {
  return new Map(
    lines.map((line) => {
      const end = line.indexOf(' ');
      return [line.slice(0, end), line.slice(end + 1)];
    }),
  );
}

/** The last of them, oldest first, as far as there is room. */
function newestLines(texts: ReadonlyMap<string, string>): string[] {
  const lines: string[] = [];
  let room = mostCharacters;
  for (const [key, text] of [...texts].reverse()) {
    room -= key.length + text.length + 2;
    if (room < 0) break;
    lines.push(`${key} ${text}`);
  }
  return lines.reverse();
}
