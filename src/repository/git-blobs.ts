import { type Blobs, blobFrom, blobOf, type FoundBlob } from './blobs.ts';
import { ask, type Place, type Question } from './git.ts';
import { isObjectId, type ObjectFormat } from './object-id.ts';
import { ObjectReader } from './object-reader.ts';

/** Up to here a streamed blob is taken whole, so that it holds no git process while its reader thinks. */
const smallBytes = 4 * 1024 * 1024;

/**
 * Blobs from git's objects. A visit has a git child of its own. Another answers single questions in turn; a
 * large blob that is being streamed keeps that child, and the next question starts another, so that readers
 * may go through several streams in step.
 * Only full ids are asked for: git would take any other text as a revision.
 */
export function gitBlobs(place: Place, objectFormat: ObjectFormat): Blobs {
  const living = new Set<ObjectReader>();
  let free: ObjectReader | null = null;
  let turn: Promise<unknown> = Promise.resolve();
  let closed = false;

  const start = (list?: readonly string[]) => {
    // Where one of several tasks fails, others go on for a while; a child that they started now would never end, nor this run.
    if (closed) throw new Error('These blobs are closed.');
    const reader = new ObjectReader(place, list);
    living.add(reader);
    return reader;
  };
  const end = async (reader: ObjectReader) => {
    living.delete(reader);
    if (free === reader) free = null;
    await reader.end();
  };
  const inTurn = <Answer>(use: (reader: ObjectReader) => Promise<Answer>): Promise<Answer> => {
    const mine = turn.then(async () => {
      free ??= start();
      const reader = free;
      try {
        return await use(reader);
      } catch (cause) {
        // Nobody knows how far it has come.
        await end(reader);
        throw cause;
      }
    });
    turn = mine.catch(() => {});
    return mine;
  };

  async function* large(reader: ObjectReader, blob: FoundBlob): AsyncGenerator<Uint8Array> {
    let whole = false;
    try {
      yield* blob.chunks();
      whole = true;
    } finally {
      if (whole && free === null) free = reader;
      else await end(reader);
    }
  }

  return {
    async visit(ids, visitor) {
      if (ids.length === 0) return;
      const reader = start(ids);
      try {
        for (const id of ids) await visitor(id, await reader.next(id));
      } finally {
        await end(reader);
      }
    },
    sizes: (ids) => ask(place, blobSizes(ids)),
    open: async (id) =>
      isObjectId(id, objectFormat)
        ? inTurn(async (reader) => {
            const blob = await reader.ask(id);
            if (blob === null) return null;
            if (blob.bytes <= smallBytes) return blobOf(await blob.whole());
            free = null;
            return blobFrom(blob.bytes, () => large(reader, blob));
          })
        : null,
    async close() {
      closed = true;
      await Promise.all([...living].map(end));
    },
  };
}

/** The bytes of those objects that are there and are blobs. */
export function blobSizes(ids: readonly string[]): Question<ReadonlyMap<string, number>> {
  return {
    args: ['cat-file', '--batch-check', '--buffer'],
    input: Buffer.from(ids.map((id) => `${id}\n`).join('')),
    parse: (output) =>
      new Map(
        output
          .toString('latin1')
          .split('\n')
          .map((line) => line.split(' '))
          .flatMap(([id = '', type, size]) => (type === 'blob' ? [[id, Number(size)] as const] : [])),
      ),
  };
}
