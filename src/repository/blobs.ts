/** Content of blobs by id, wherever it is kept. */
export interface Blobs {
  /** Visits each id in order; null where there is no such blob. A visitor may leave content unread. */
  visit(
    ids: readonly string[],
    visitor: (id: string, blob: FoundBlob | null) => Promise<void>,
  ): Promise<void>;
  /** The bytes of each blob that is there, nothing of it read. */
  sizes(ids: readonly string[]): Promise<ReadonlyMap<string, number>>;
  /** One blob, to be read at the reader's pace; null where there is no such blob. */
  open(id: string): Promise<FoundBlob | null>;
  close(): Promise<void>;
}

export interface FoundBlob {
  readonly bytes: number;
  /** In chunks that may be kept only until the next one. */
  chunks(): AsyncIterable<Uint8Array>;
  /** All of it, in memory of its own. */
  whole(): Promise<Uint8Array>;
}

/** A blob that is in memory already. */
export function blobOf(content: Uint8Array): FoundBlob {
  return {
    bytes: content.length,
    async *chunks() {
      yield content;
    },
    whole: async () => content,
  };
}

/** A blob that comes in chunks. */
export function blobFrom(bytes: number, chunks: () => AsyncIterable<Uint8Array>): FoundBlob {
  return {
    bytes,
    chunks,
    async whole() {
      const whole = new Uint8Array(bytes);
      let at = 0;
      for await (const chunk of chunks()) {
        whole.set(chunk, at);
        at += chunk.length;
      }
      return whole;
    },
  };
}
