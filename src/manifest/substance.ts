import { kinds } from './kinds.generated.ts';
import type { FieldPath } from './manifest.ts';

/** The parts of a fragment that a seal tells apart. */
export interface Parts {
  /** What others depend on: figures, names, paths, dates, choices. Null where there is none. */
  readonly substance: unknown;
  /** Pure prose, in the fragment's shape; null where there is none. */
  readonly wording: unknown;
  /** Each acceptance in the fragment, in order. */
  readonly accepts: readonly unknown[];
}

/** Splits the fragment that stands at a field, such as `['inputs', 'rainfall']`, by the schema's marks. */
export function splitFragment(field: FieldPath, fragment: unknown): Parts {
  const kind = field.reduce<string | undefined>(kindOf, 'ManifestData');
  const accepts: unknown[] = [];
  const { substance, wording } = split(kind, fragment, accepts);
  return { substance: substance ?? null, wording: wording ?? null, accepts };
}

function kindOf(kind: string | undefined, part: string | number): string | undefined {
  const known = (kind === undefined ? undefined : kinds[kind]) ?? {};
  const key = typeof part === 'number' ? '[]' : part;
  return Object.hasOwn(known, key) ? known[key] : known['*'];
}

type Halves = { readonly substance?: unknown; readonly wording?: unknown };

function split(kind: string | undefined, value: unknown, accepts: unknown[]): Halves {
  if (kind === 'prose') return { wording: value };
  if (kind === 'accepts') {
    accepts.push(...(value as readonly unknown[]));
    return {};
  }
  if (kind === undefined || typeof value !== 'object' || value === null) return { substance: value };
  if (Array.isArray(value)) {
    const halves = value.map((item, place) => split(kindOf(kind, place), item, accepts));
    const wording = halves.map((half) => half.wording ?? null);
    const substance = halves.map((half) => half.substance ?? null);
    return wording.every((half) => half === null) ? { substance } : { substance, wording };
  }
  const halves = Object.entries(value).map(
    ([key, item]) => [key, split(kindOf(kind, key), item, accepts)] as const,
  );
  const having = (part: keyof Halves) =>
    halves.flatMap(([key, half]) => (half[part] === undefined ? [] : [[key, half[part]] as const]));
  const substance = Object.fromEntries(having('substance'));
  const wording = having('wording');
  return wording.length === 0 ? { substance } : { substance, wording: Object.fromEntries(wording) };
}
