import type { ErrorObject } from 'ajv';
import { type Breach, faultOf } from './breach.ts';
import type { Fault } from './fault.ts';
import type { Locate } from './locate.ts';
import type { FieldPath } from './manifest.ts';
import { nearestName } from './nearest.ts';
import { wordsMeantBy } from './other-words.ts';
import * as validators from './validate-manifest.generated.js';

type Validator = typeof validators.ManifestData;
const byName: Readonly<Record<string, Validator>> = validators;

/** Every fault of a manifest's data against the schema, one for each mistake. */
export function schemaFaults(data: unknown, locate: Locate): readonly Fault[] {
  return breaches(validators.ManifestData, data, []).map((breach) => faultOf(breach, locate));
}

function breaches(validate: Validator, data: unknown, base: FieldPath): readonly Breach[] {
  if (validate(data)) return [];
  const errors = validate.errors ?? [];
  // By place; the last at one place is the outer one, since members are tried before their union fails.
  const unions = new Map(
    errors.filter(({ keyword }) => keyword === 'anyOf').map((union) => [union.instancePath, union]),
  );
  const plain = errors
    .filter(({ keyword }) => keyword !== 'if' && keyword !== 'propertyNames')
    .filter(({ instancePath }) => !unions.has(instancePath) && !isBelow(instancePath, unions))
    .map((error) => toBreach(error, data, base));
  const inUnions = [...unions.values()]
    .filter(({ instancePath }) => !isBelow(instancePath, unions))
    .flatMap((union) => unionBreaches(union, toBreach(union, data, base)));
  return onePerMistake([...plain, ...inUnions]);
}

/** Whether a JSON Pointer leads below one of some places. */
function isBelow(pointer: string, places: ReadonlyMap<string, unknown>): boolean {
  for (let place = pointer; place !== ''; ) {
    place = place.slice(0, place.lastIndexOf('/'));
    if (places.has(place)) return true;
  }
  return false;
}

/** What is wrong with the list or map that was most probably meant; the union as a whole where neither is there. */
function unionBreaches(union: ErrorObject, asWhole: Breach): readonly Breach[] {
  const members: readonly { readonly $ref?: string }[] = union.parentSchema?.anyOf ?? [];
  const tries = members
    .map(({ $ref = '' }) => byName[$ref.slice('#/$defs/'.length)])
    .filter((validate) => validate !== undefined)
    .map((validate) => breaches(validate, union.data, asWhole.field))
    .filter(
      (tried) =>
        !tried.some(({ field, error }) => error.keyword === 'type' && field.length === asWhole.field.length),
    )
    .sort((one, other) => one.length - other.length);
  return tries[0] ?? [asWhole];
}

function toBreach(error: ErrorObject, data: unknown, base: FieldPath): Breach {
  const field = [...base, ...fieldIn(data, error.instancePath)];
  const unknown: unknown = error.params.additionalProperty ?? error.propertyName;
  if (typeof unknown !== 'string') return { field, error };
  const known = Object.keys(error.parentSchema?.properties ?? {});
  return { field: [...field, unknown], error, nearest: nearestKey(unknown, known) };
}

function nearestKey(unknown: string, known: readonly string[]): string | undefined {
  return wordsMeantBy(unknown).find((word) => known.includes(word)) ?? nearestName(unknown, known);
}

/** The first fault of each field, and no missing key where an unknown one seems to be that key mistyped. */
function onePerMistake(found: readonly Breach[]): readonly Breach[] {
  const seen = new Set<string>();
  const mistyped = new Set(
    found.map(({ field, nearest }) => JSON.stringify([...field.slice(0, -1), nearest])),
  );
  return found.filter(({ field, error }) => {
    const missing: unknown = error.params.missingProperty;
    const place = JSON.stringify(missing === undefined ? field : [...field, missing]);
    if (seen.has(place) || (missing !== undefined && mistyped.has(place))) return false;
    seen.add(place);
    return true;
  });
}

/** A JSON Pointer as keys and list places. */
function fieldIn(data: unknown, pointer: string): FieldPath {
  let value = data;
  return pointer
    .split('/')
    .slice(1)
    .map((part) => {
      const key = part.replaceAll('~1', '/').replaceAll('~0', '~');
      const step = Array.isArray(value) ? Number(key) : key;
      value = (value as Record<string | number, unknown>)[step];
      return step;
    });
}
