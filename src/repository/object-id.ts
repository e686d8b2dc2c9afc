import { createHash } from 'node:crypto';

export type ObjectFormat = 'sha1' | 'sha256';

/** Git's id of an object: the digest of `<type> <bytes>\0` and its content (git's documentation, "gitformat-loose" and "hash-function-transition"). */
export function objectId(type: 'blob' | 'tree', content: string | Uint8Array, format: ObjectFormat): string {
  const bytes = Buffer.from(content);
  return createHash(format).update(`${type} ${bytes.length}\0`).update(bytes).digest('hex');
}

/** True for a full id in the repository's format; anything else that git might resolve is none. */
export function isObjectId(text: string, format: ObjectFormat): boolean {
  return (format === 'sha1' ? /^[0-9a-f]{40}$/ : /^[0-9a-f]{64}$/).test(text);
}
