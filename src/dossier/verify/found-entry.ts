/** One entry of a package that is read back; nothing about it is to be trusted. */
export interface FoundEntry {
  readonly path: string;
  readonly kind: 'file' | 'folder' | 'link' | 'other';
  /** To be read, if at all, before the next entry is asked for. */
  chunks(): AsyncIterable<Uint8Array>;
}
