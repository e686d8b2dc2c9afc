import type { FieldPath } from '../manifest/manifest.ts';

/** A value taken from the model's own control, log or output file, to be held against a record. */
export interface Reading {
  /** The record and the field that the reading is about. */
  readonly record: string;
  readonly of: FieldPath;
  /** Where the reading itself stands in the manifest. */
  readonly field: FieldPath;
  /** From the top of the repository, and the line where the value stands (from 1; null when not found). */
  readonly file: string;
  readonly line: number | null;
  /** What the record says, made comparable by `as`; null where the record is silent. */
  readonly stated: string | number | null;
  /** What the file says; null with `problem` when it could not be taken. */
  readonly found: string | number | null;
  readonly agrees: boolean;
  readonly problem: string | null;
}
