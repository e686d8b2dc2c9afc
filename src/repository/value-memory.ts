import { join } from 'node:path';
import { loadLines, saveLines } from './kept-lines.ts';
import type { Snapshot } from './snapshot.ts';

/** Values by key, kept between runs so that unchanged content is not read again. */
export interface ValueMemory {
  readonly remember: Snapshot['remember'];
  /** Keeps what is new. A folder that cannot be written is no fault: the memory is disposable. */
  save(): Promise<void>;
}

const firstLine = 'stoplog values 1';
/** Above this those go that were not asked for longest. */
const mostCharacters = 16 * 2 ** 20;

/** The memory of a repository, in `stoplog/values` below its common git directory; read when first asked. */
export function openValueMemory(commonDirectory: string): ValueMemory {
  const file = join(commonDirectory, 'stoplog', 'values');
  const load = async () => textsFromLines(await loadLines(file, firstLine));
  const { remember, asked, fresh } = valuesOver(load);
  return {
    remember,
    async save() {
      if (fresh.size === 0) return;
      // Another run may have saved meanwhile; what it computed is as true as ours.
      const all = await load();
      for (const key of asked) {
        const text = fresh.get(key) ?? all.get(key);
        all.delete(key);
        if (text !== undefined) all.set(key, text);
      }
      await saveLines(file, firstLine, newestLines(all));
    },
  };
}

/** A memory that forgets at the end of the run. */
export function forgetfulValues(): ValueMemory {
  const { remember } = valuesOver(async () => new Map());
  return { remember, save: async () => {} };
}

/** The values of one run over those kept before; `fresh` holds the JSON of those computed in it, `asked` the keys in order. */
function valuesOver(load: () => Promise<ReadonlyMap<string, string>>) {
  const inRun = new Map<string, Promise<unknown>>();
  const fresh = new Map<string, string>();
  let kept: Promise<ReadonlyMap<string, string>> | undefined;
  async function answer(key: string, compute: () => Promise<unknown>): Promise<unknown> {
    kept ??= load();
    let text = (await kept).get(key);
    if (text === undefined) {
      text = JSON.stringify((await compute()) ?? null);
      fresh.set(key, text);
    }
    return JSON.parse(text);
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
