import { sha256OfJson } from './canonical.ts';
import { grades, type Seal } from './seal.ts';

/** Completes a seal with the checksum over all its other fields, so that a hand edit shows. */
export function withChecksum(entry: Omit<Seal, 'checksum'>): Seal {
  return { ...entry, checksum: checksumOf(entry) };
}

/** SHA-256 over the canonical JSON of everything in an entry but its checksum. */
export function checksumOf(entry: object): string {
  const { checksum: _, ...rest } = entry as Record<string, unknown>;
  return sha256OfJson(rest);
}

type Check = (value: unknown) => boolean;

const isText: Check = (value) => typeof value === 'string';
const isDigest: Check = (value) => isText(value) && /^[0-9a-f]{64}$/.test(String(value));
const isCount: Check = (value) => Number.isSafeInteger(value) && Number(value) >= 0;
const orNull =
  (check: Check): Check =>
  (value) =>
    value === null || check(value);
const listOf =
  (check: Check): Check =>
  (value) =>
    Array.isArray(value) && value.every(check);
const mapOf =
  (check: Check): Check =>
  (value) =>
    isMap(value) && Object.values(value).every(check);
const having =
  (fields: Readonly<Record<string, Check>>): Check =>
  (value) =>
    isMap(value) && wrongField(value, fields) === null;

/** Whether a JSON value is an object that is no list. */
export function isMap(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

const fields: Readonly<Record<keyof Seal, Check>> = {
  scheme: (value) => isCount(value) && value !== 0,
  substance: isDigest,
  wording: isDigest,
  accepts: listOf(isDigest),
  files: mapOf(having({ sha256: orNull(isDigest), bytes: orNull(isCount), blob: orNull(isText) })),
  rests_on: mapOf(isDigest),
  digest: isDigest,
  outcome: orNull(isDigest),
  driven_by: mapOf(orNull(isDigest)),
  unmoved: listOf(isText),
  facts: mapOf(
    having({ value: (value) => isText(value) || Number.isFinite(value), computed_by: Number.isFinite }),
  ),
  sealed_by: isText,
  sealed_on: (value) => isText(value) && /^\d{4}-\d{2}-\d{2}$/.test(String(value)),
  grade: (value) => grades.some((grade) => grade !== 'stated' && grade === value),
  because: orNull(isText),
  checksum: isDigest,
};

/** The first field of an entry that is not as a seal has it, or that no seal has; null where all is well. */
export function faultyField(entry: Record<string, unknown>): string | null {
  return wrongField(entry, fields);
}

function wrongField(value: Record<string, unknown>, known: Readonly<Record<string, Check>>): string | null {
  const wrong = Object.entries(known).find(([name, check]) => !check(value[name]))?.[0];
  return wrong ?? Object.keys(value).find((name) => !Object.hasOwn(known, name)) ?? null;
}
