import { hash } from 'node:crypto';
import { OfAnotherPart } from '../repository/part.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { version as program } from '../version.ts';
import type { ManifestData } from './data.generated.ts';
import { folderOf } from './discover.ts';
import { schemaDigest } from './kinds.generated.ts';
import type { FieldPath, Manifest, ReadManifest } from './manifest.ts';
import { readManifest } from './read.ts';

/** Raised whenever the same text may be read otherwise and the schema is the same. */
const version = 1;

/** A field and what stands in it: line, column, the scalar as written, and the fields below by key or place. */
type Place = readonly [line: number, column: number, source: string | null, below?: Below];
type Below = Readonly<Record<string | number, Place>>;

interface Kept {
  readonly data: unknown;
  readonly place: Place;
}

/** As `readManifest` gives it. A text without problems is read once and remembered, as reading takes longer than the rest of most checks. */
export async function rememberedManifest(
  path: string,
  text: string,
  { remember }: Pick<Snapshot, 'remember'>,
): Promise<ReadManifest> {
  const key = hash('sha256', `manifest ${version} ${program} ${schemaDigest}\0${text}`);
  let read: ReadManifest | undefined;
  const kept = await remember(key, async () => {
    read = readManifest(path, text);
    return read.manifest === null ? null : keep(read.manifest);
  }).catch((error: unknown) => {
    if (error instanceof OfAnotherPart) return null;
    throw error;
  });
  if (read !== undefined) return read;
  return kept === null ? readManifest(path, text) : { manifest: revive(path, text, kept), problems: [] };
}

function keep({ data, position, source }: Manifest): Kept {
  const placeOf = (value: unknown, field: FieldPath): Place => {
    const { line, column } = position(field);
    if (typeof value !== 'object' || value === null) return [line, column, source(field)];
    const below = Object.entries(value).map(
      ([key, one]) => [key, placeOf(one, [...field, Array.isArray(value) ? Number(key) : key])] as const,
    );
    return [line, column, null, Object.fromEntries(below)];
  };
  return { data, place: placeOf(data, []) };
}

function revive(path: string, text: string, { data, place }: Kept): Manifest {
  /** The nearest place that exists, and whether it is the field's own. */
  const find = (field: FieldPath): { readonly found: Place; readonly isOwn: boolean } => {
    let found = place;
    for (const part of field) {
      const [, , , below] = found;
      if (below === undefined || !Object.hasOwn(below, part)) return { found, isOwn: false };
      found = below[part] ?? found;
    }
    return { found, isOwn: true };
  };
  return {
    path,
    folder: folderOf(path),
    text,
    data: withoutPrototypes(data) as ManifestData,
    position(field) {
      const [line, column] = find(field).found;
      return { line, column };
    },
    source(field) {
      const { found, isOwn } = find(field);
      return isOwn ? found[2] : null;
    },
  };
}

/** A name such as `constructor` is a name like any other. */
function withoutPrototypes(value: unknown): unknown {
  if (typeof value !== 'object' || value === null) return value;
  if (Array.isArray(value)) return value.map(withoutPrototypes);
  const map: Record<string, unknown> = Object.create(null);
  for (const [key, one] of Object.entries(value)) map[key] = withoutPrototypes(one);
  return map;
}
