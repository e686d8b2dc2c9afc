import type { Reading as StatedReading } from '../manifest/data.generated.ts';
import type { FieldPath } from '../manifest/manifest.ts';
import { holderOf, keysBelow, valueAt } from '../records/field.ts';
import { resolvePattern } from '../records/find-paths.ts';
import { asWhole, type RecordNode, type Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import { compare } from './compare.ts';
import { take } from './take.ts';

/** A value taken from the model's own control, log or output file, to be held against a record. */
export interface Reading {
  /** The record and the field that the reading is about. */
  readonly record: string;
  readonly of: FieldPath;
  /** The field as the reading names it, such as `parameters.soil_capacity`. */
  readonly name: string;
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
  /** Why it could not be taken, as the end of a sentence. */
  readonly problem: string | null;
}

/** Logs can be long; no honest control file or log to take a value from is longer. */
const largestBytes = 16 * 2 ** 20;

/** Every reading of a manifest, in its order; each file is read once. */
export async function takeReadings(records: Records, snapshot: Snapshot): Promise<readonly Reading[]> {
  const { data, folder } = records.manifest;
  const contents = new Map<string, Promise<Uint8Array | string>>();
  return Promise.all(
    (data.readings ?? []).map(async (reading, index) => {
      const place = resolvePattern(folder, reading.file);
      const file = place === null ? reading.file : place.root + place.rest;
      if (!contents.has(file)) contents.set(file, contentOf(file, snapshot));
      const content = (await contents.get(file)) ?? '';
      return { ...takeReading(reading, file, content, records), field: ['readings', index] };
    }),
  );
}

/** The bytes of a file, or why they are not to be had. */
async function contentOf(file: string, snapshot: Snapshot): Promise<Uint8Array | string> {
  const identity = (await snapshot.identify([file])).get(file);
  if (identity === undefined || identity.kind === 'unavailable') return `the content of ${file} is not here`;
  if (identity.bytes > largestBytes) return `${file} is larger than ${largestBytes / 2 ** 20} MB`;
  return (await snapshot.read(file)) ?? `the content of ${file} is not here`;
}

function takeReading(
  reading: StatedReading,
  file: string,
  content: Uint8Array | string,
  { nodes }: Records,
): Omit<Reading, 'field'> {
  const holder = holderOf(reading.of, nodes);
  const { of, value, unit } = fieldOf(reading.of, holder);
  const about = { record: holder?.id ?? asWhole, of, name: reading.of, file };
  const failed = { stated: null, found: null, agrees: false };
  const taken = typeof content === 'string' ? content : take(content, reading.take, file);
  if (typeof taken === 'string') return { ...about, ...failed, line: null, problem: taken };
  const compared = compare(taken.value, value, { as: reading.as, from: reading.unit, to: unit });
  if (typeof compared === 'string') {
    const where = taken.line === null ? file : `${file} line ${taken.line}`;
    return { ...about, ...failed, line: taken.line, problem: `${where} ${compared}` };
  }
  return { ...about, ...compared, line: taken.line, problem: null };
}

interface StatedField {
  readonly of: FieldPath;
  readonly value: unknown;
  readonly unit: string | undefined;
}

/** The field that a reading is of; `parameters.soil_capacity` stands for the value of the parameter of that name. */
function fieldOf(address: string, holder: RecordNode | undefined): StatedField {
  if (holder === undefined) return { of: [], value: undefined, unit: undefined };
  const keys = keysBelow(holder.id, address);
  if (holder.area === 'parameters') {
    const { values = [] } = holder.fragment as RecordNode<'parameters'>['fragment'];
    const place = values.findIndex(({ name }) => name === keys.join('.'));
    const parameter = values[place];
    if (parameter !== undefined) {
      return { of: ['parameters', 'values', place, 'value'], value: parameter.value, unit: parameter.unit };
    }
  }
  const of = [...holder.field, ...keys.map((key) => (/^\d+$/.test(key) ? Number(key) : key))];
  const unit = valueAt(holder.fragment, [...keys.slice(0, -1), 'unit']);
  return { of, value: valueAt(holder.fragment, keys), unit: typeof unit === 'string' ? unit : undefined };
}
