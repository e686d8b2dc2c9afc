import { type Blobs, blobOf, type FoundBlob, wholeOf } from './blobs.ts';
import type { Place } from './git.ts';
import { isObjectId, type ObjectFormat } from './object-id.ts';
import { ObjectReader } from './object-reader.ts';

/** Up to here a streamed blob is taken whole, so that it holds no git process while its reader thinks. */
const smallBytes = 4 * 1024 * 1024;

/**
 * Blobs from git's objects. One git child answers everything in turn; a large blob that is being streamed
 * keeps that child, and the next question starts another. So readers may go through several streams in step.
 * Only full ids are asked for: git would take any other text as a revision.
 */
export function gitBlobs(place: Place, objectFormat: ObjectFormat): Blobs {
  const living = new Set<ObjectReader>();
  let free: ObjectReader | null = null;
  let turn: Promise<unknown> = Promise.resolve();

  const start = () => {
    const reader = new ObjectReader(place);
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
    visit: (ids, visitor) =>
      inTurn(async (reader) => {
        if (ids.length > 0) reader.ask(ids);
        for (const id of ids) await visitor(id, await reader.next(id));
      }),
    open: async (id) =>
      isObjectId(id, objectFormat)
        ? inTurn(async (reader) => {
            reader.ask([id]);
            const blob = await reader.next(id);
            if (blob === null) return null;
            if (blob.bytes <= smallBytes) return blobOf(await wholeOf(blob));
            free = null;
            return { bytes: blob.bytes, chunks: () => large(reader, blob) };
          })
        : null,
    async close() {
      await Promise.all([...living].map(end));
    },
  };
}
