/** A file of the package, in the order in which it is written. */
export interface PackedFile {
  /** From the package's top, with `/`. */
  readonly path: string;
  readonly bytes: number;
  readonly executable: boolean;
  /** To be read to its end, once, before the next file is asked for; a chunk may be kept only until the next one. */
  chunks(): AsyncIterable<Uint8Array>;
}

export function fileOfBytes(path: string, content: string | Uint8Array): PackedFile {
  const bytes = typeof content === 'string' ? new TextEncoder().encode(content) : content;
  return {
    ...{ path, bytes: bytes.length, executable: false },
    async *chunks() {
      yield bytes;
    },
  };
}
