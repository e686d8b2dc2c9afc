import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';

/** The one way to write a JSON value: RFC 8785, JSON Canonicalization Scheme. */
export function canonicalJson(value: unknown): string {
  return canonicalize(value) ?? 'null';
}

/** SHA-256 of a value's canonical JSON, 64 hexadecimal digits. */
export function sha256OfJson(value: unknown): string {
  return createHash('sha256').update(canonicalJson(value)).digest('hex');
}
