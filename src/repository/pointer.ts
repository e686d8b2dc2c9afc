/** What a Git LFS pointer names. */
export interface Pointer {
  /** Of the content, from the pointer's `oid`. */
  readonly sha256: string;
  readonly bytes: number;
  /** Extensions changed the content before it was stored, so what is stored is not what a checkout gives. */
  readonly extended: boolean;
}

/** Pointers are smaller than this (Git LFS specification, "The Pointer"). */
export const pointerBytesBelow = 1024;

const version =
  '(?:https://git-lfs\\.github\\.com/spec/v1|https://hawser\\.github\\.com/spec/v1|http://git-media\\.io/v/2)';
const line = (body: string) => `${body}(?:\\r?\\n)+`;
const form = new RegExp(
  `^${line(`version ${version}`)}((?:${line('ext-\\d-\\w+ sha256:[0-9a-f]{64}')})*)${line('oid sha256:([0-9a-f]{64})')}size \\+?(\\d+)$`,
);

/**
 * Reads a blob as a Git LFS pointer, or answers null: the keys of the specification (git-lfs, docs/spec.md)
 * in its order. White space around it, Windows line ends and the two older version lines are read as the
 * git-lfs program reads them, since a clone with Git LFS would replace such a blob, too.
 */
export function parsePointer(content: Uint8Array): Pointer | null {
  if (content.length >= pointerBytesBelow) return null;
  const [, extensions = '', sha256, size] = form.exec(Buffer.from(content).toString('latin1').trim()) ?? [];
  const bytes = Number(size);
  const places = [...extensions.matchAll(/^ext-(\d)/gm)].map(([, place]) => place);
  if (sha256 === undefined || !Number.isSafeInteger(bytes) || new Set(places).size < places.length)
    return null;
  return { sha256, bytes, extended: places.length > 0 };
}
