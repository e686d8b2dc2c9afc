import type { ManifestData } from './data.generated.ts';

/** Keys and list places from the top of the manifest, such as `['inputs', 'rainfall', 'files', 0]`. */
export type FieldPath = readonly (string | number)[];

export interface Position {
  /** Both from 1. */
  readonly line: number;
  readonly column: number;
}

/** One `stoplog.yaml`, read and valid against the schema. */
export interface Manifest {
  /** From the top of the repository. */
  readonly path: string;
  /** The folder that it governs, from the top of the repository, without a final `/`; empty for the top. */
  readonly folder: string;
  readonly text: string;
  readonly data: ManifestData;
  /** Where a field stands: its key for a mapping entry, its first character for a list entry; the nearest existing ancestor when the field is absent. */
  position(field: FieldPath): Position;
  /** The text of a scalar as it is written (`0.70`, not 0.7); null where the field is absent or no plain scalar. */
  source(field: FieldPath): string | null;
}

/** One fault of a manifest. All faults are reported at once. */
export interface Problem extends Position {
  /** The field as written in messages, such as `inputs.rainfall.series.step`; empty for the document. */
  readonly field: string;
  /** What stands there and what was expected, in one sentence. */
  readonly message: string;
  readonly expected: string;
  readonly found: string;
  /** The known key nearest to an unknown one. */
  readonly nearest?: string;
}

export type ReadManifest =
  | { readonly manifest: Manifest; readonly problems: readonly [] }
  | { readonly manifest: null; readonly problems: readonly Problem[] };

/** `inputs.rainfall.files[0]`: how a field is written in messages. */
export function fieldName(field: FieldPath): string {
  return field.reduce<string>(
    (name, part) => (typeof part === 'number' ? `${name}[${part}]` : name === '' ? part : `${name}.${part}`),
    '',
  );
}
