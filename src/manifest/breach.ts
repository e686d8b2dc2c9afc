import type { ErrorObject } from 'ajv';
import { isScalar } from 'yaml';
import { type Fault, quoted, shortened, shown } from './fault.ts';
import type { Locate } from './locate.ts';
import { type FieldPath, fieldName } from './manifest.ts';
import { meantValues, type Wanted } from './meant.ts';
import { nearestName } from './nearest.ts';

/** A place in the data that breaks the schema. */
export interface Breach {
  /** For an unknown or ill-named key, up to and with that key; for a missing one, the map that lacks it. */
  readonly field: FieldPath;
  readonly error: ErrorObject;
  /** The known key nearest to an unknown one. */
  readonly nearest?: string | undefined;
}

/** A breach in words, at its place in the text. */
export function faultOf(breach: Breach, locate: Locate): Fault {
  const { error } = breach;
  if (error.params.missingProperty !== undefined) return missingKey(breach, locate);
  if (error.propertyName !== undefined) return illNamed(breach, locate);
  if (error.params.additionalProperty !== undefined) return unknownKey(breach, locate);
  return unfitValue(breach, locate);
}

function missingKey({ field, error }: Breach, locate: Locate): Fault {
  const { parentSchema = {}, params } = error;
  const key = String(params.missingProperty);
  const lacking: string = parentSchema['x-expects'] ?? `\`${key}\``;
  const wanted: string | undefined = parentSchema.properties?.[key]?.['x-expects'];
  const expected = wanted === undefined ? lacking : `${lacking}: ${wanted}`;
  const where = field.length === 0 ? 'The manifest' : `\`${fieldName(field)}\``;
  const message = `${where} lacks ${lacking}${wanted === undefined ? '' : `; expected ${wanted}`}.`;
  return { offset: keyOffset(field, locate), field, message, expected, found: 'nothing' };
}

function illNamed({ field, error }: Breach, locate: Locate): Fault {
  const name = String(error.propertyName);
  const expected = expectation(error);
  const message = `The name ${quoted(name)} can’t be used; expected ${expected}.`;
  return { offset: keyOffset(field, locate), field, message, expected, found: quoted(name) };
}

function unknownKey({ field, error, nearest }: Breach, locate: Locate): Fault {
  const key = String(error.params.additionalProperty);
  const parent = field.length === 1 ? 'a manifest' : `\`${fieldName(field.slice(0, -1))}\``;
  const known = Object.keys(error.parentSchema?.properties ?? {}).join(', ');
  const hint = /^\d+$/.test(key)
    ? 'a decimal point is a point, as in 0.83, and no comma'
    : nearest === undefined
      ? `it knows ${known}`
      : `perhaps \`${nearest}\` is meant`;
  return {
    offset: keyOffset(field, locate),
    field,
    message: `\`${key}\` is no key of ${parent}; ${hint}.`,
    expected: `one of ${known}`,
    found: `\`${key}\``,
    nearest,
  };
}

function unfitValue({ field, error }: Breach, locate: Locate): Fault {
  const { key, value: node } = locate(field);
  const { data } = error;
  const name = `\`${fieldName(field)}\``;
  const expected = expectation(error);
  const written = isScalar(node) && typeof data !== 'string' ? node.source : undefined;
  const at = { field, expected, offset: (data === null && key !== null ? key : node)?.range?.[0] ?? 0 };

  if (data === null) {
    const message = `${name} is empty; expected ${expected}. Fill it in, or take the key out.`;
    return { ...at, found: 'nothing', message };
  }
  if (written !== undefined && wouldFitInQuotes(written, error)) {
    const message = `${name} is ${written} without quotes, which YAML does not read as a text; write it in quotes: "${written}".`;
    return { ...at, found: `${written} without quotes`, message };
  }
  const found = written ?? shown(data);
  return { ...at, found, message: `${name} is ${found}; expected ${expected}.${perhaps(error)}` };
}

/** What was probably meant, as a sentence with a blank before it; nothing where nothing suggests itself. */
function perhaps({ data, params, parentSchema = {} }: ErrorObject): string {
  const near = typeof data === 'string' ? nearestName(data, params.allowedValues ?? []) : undefined;
  const meant = meantValues(data, parentSchema as Wanted);
  const [only] = meant;
  if (typeof only === 'number' && String(only) === data) return ' Write it without quotes.';
  const words = meant.length === 0 && near !== undefined ? [near] : meant;
  if (words.length === 0) return '';
  return ` Perhaps ${words.map((word) => `\`${asYaml(word)}\``).join(' or ')} is meant.`;
}

/** A value as it is written in a manifest: quotes only where YAML would take a text for something else. */
function asYaml(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(asYaml).join(', ')}]`;
  return typeof value === 'string' && /^[+\d][\d:]*$/.test(value) ? quoted(value) : shortened(String(value));
}

/** Whether a number, true or false would do as a text, as a version does. */
function wouldFitInQuotes(written: string, { keyword, params, parentSchema = {} }: ErrorObject): boolean {
  if (keyword !== 'type' || params.type !== 'string' || parentSchema.format !== undefined) return false;
  return new RegExp(parentSchema.pattern ?? '', 'u').test(written);
}

/** What the schema wants where an error arose, in words. */
function expectation({ keyword, params, parentSchema = {} }: ErrorObject): string {
  if (parentSchema['x-expects'] !== undefined) return parentSchema['x-expects'];
  if (keyword === 'enum') return `one of ${params.allowedValues.join(', ')}`;
  const { type, minimum, maximum, exclusiveMinimum, exclusiveMaximum, minItems } = parentSchema;
  const limits = [
    minimum !== undefined && `from ${minimum}`,
    maximum !== undefined && `to ${maximum}`,
    exclusiveMinimum !== undefined && `above ${exclusiveMinimum}`,
    exclusiveMaximum !== undefined && `and below ${exclusiveMaximum}`,
    minItems !== undefined && `of at least ${minItems} ${minItems === 1 ? 'entry' : 'entries'}`,
  ];
  // Where the keys are names that the writer gives, `propertyNames` says what they may hold.
  const named = parentSchema.properties ?? (parentSchema.propertyNames === undefined ? {} : { NAME: null });
  const keys = type === 'object' ? Object.keys(named).slice(0, 3) : [];
  const example = keys.length > 0 && `such as {${keys.map((key) => `${key}: ...`).join(', ')}}`;
  return [typeWords(type), ...limits, example].filter(Boolean).join(' ');
}

function typeWords(type: string | readonly string[]): string {
  const words: Readonly<Record<string, string>> = {
    string: 'a text',
    number: 'a number',
    integer: 'a whole number',
    boolean: 'true or false',
    array: 'a list',
    object: 'a map of keys',
  };
  return [type]
    .flat()
    .map((one) => words[one] ?? one)
    .join(' or ');
}

function keyOffset(field: FieldPath, locate: Locate): number {
  const { key, value } = locate(field);
  return (key ?? value)?.range?.[0] ?? 0;
}
