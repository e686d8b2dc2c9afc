import { sha256OfJson } from './canonical.ts';

/** All that a record's digest is made of. No time, person, grade or reason: same content, same digest. */
export interface DigestParts {
  /** Number of the scheme. */
  readonly scheme: number;
  readonly substance: string;
  /** Path from the manifest's folder -> SHA-256; null where the content could not be verified. */
  readonly files: Readonly<Record<string, string | null>>;
  /** What it rests on -> digest. */
  readonly rests_on: Readonly<Record<string, string>>;
}

/** The digest of a record: SHA-256 of the RFC 8785 canonical JSON of its parts. */
export function digestOf({ scheme, substance, files, rests_on }: DigestParts): string {
  return sha256OfJson({ scheme, substance, files, rests_on });
}
