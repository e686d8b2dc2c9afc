import { wordsMeantBy } from './other-words.ts';
import { isDate, parsePeriod } from './period.ts';

/** The part of a schema that tells whether a value would do. */
export interface Wanted {
  readonly type?: string | readonly string[];
  readonly enum?: readonly unknown[];
  readonly format?: string;
  readonly pattern?: string;
  readonly minimum?: number;
  readonly maximum?: number;
  readonly exclusiveMinimum?: number;
  readonly exclusiveMaximum?: number;
  readonly items?: Wanted;
  readonly anyOf?: readonly Wanted[];
}

/** Values that would do and that were probably meant by one that does not: often none, and two where a date can be read in two ways. */
export function meantValues(data: unknown, wanted: Wanted): readonly unknown[] {
  return [...new Set(candidates(data))].filter((value) => wouldDo(value, wanted));
}

function candidates(data: unknown): readonly unknown[] {
  if (typeof data === 'number')
    return [percent(data), ...asClock(String(data)), ...wordsMeantBy(String(data)), [data]];
  if (typeof data === 'string')
    return [
      ...wordsMeantBy(data),
      ...asFlag(data),
      ...asNumber(data),
      ...asDates(data),
      ...asClock(data),
      ...(/\s/.test(data) ? [] : [[data]]),
    ];
  if (typeof data !== 'object' || data === null) return [];
  const values: readonly unknown[] = Object.values(data);
  if (values.length === 1) return values.filter((value) => typeof value !== 'object');
  return values.every((value) => typeof value === 'string' && isDate(value)) ? [values.join('/')] : [];
}

function asFlag(text: string): readonly boolean[] {
  return wordsMeantBy(text).flatMap((word) => (word === 'true' ? true : word === 'false' ? false : []));
}

/** `0,83`, `50 m`, `95 %` */
function asNumber(text: string): readonly number[] {
  const [, digits, unit] = /^([+-]?\d+(?:[.,]\d+)?)\s*([^\d\s]\S*)?$/.exec(text.trim()) ?? [];
  if (digits === undefined) return [];
  const number = Number(digits.replace(',', '.'));
  return [unit === '%' ? percent(number) : number];
}

/** Without the last bits of the division. */
function percent(number: number): number {
  return Number((number / 100).toPrecision(12));
}

/** Two dates as a period, one with more behind it as a day, and `3.4.2020` as the day or the month first. */
function asDates(text: string): readonly string[] {
  const dates = text.match(/\d{4}-\d{2}-\d{2}/g) ?? [];
  if (dates.length > 0) return [dates.join('/')];
  const [, one = '', two = '', year] = /^(\d{1,2})[./-](\d{1,2})[./-](\d{4})$/.exec(text.trim()) ?? [];
  const [first, second] = [one.padStart(2, '0'), two.padStart(2, '0')];
  return year === undefined ? [] : [...new Set([`${year}-${second}-${first}`, `${year}-${first}-${second}`])];
}

/** `9`, `9:00`, `+1` and `+1:00` as an hour of the day, or as an offset. */
function asClock(text: string): readonly string[] {
  const [, sign = '', hour = '', minutes = '00'] = /^([+-]?)(\d{1,2})(?::(\d{2}))?$/.exec(text.trim()) ?? [];
  const clock = `${hour.padStart(2, '0')}:${minutes}`;
  return hour === '' ? [] : [clock, `${sign || '+'}${clock}`];
}

function wouldDo(value: unknown, wanted: Wanted): boolean {
  if (wanted.anyOf !== undefined) return wanted.anyOf.some((one) => wouldDo(value, one));
  if (wanted.enum !== undefined) return wanted.enum.includes(value);
  const types = [wanted.type ?? []].flat();
  if (Array.isArray(value))
    return types.includes('array') && value.every((one) => isOf([wanted.items?.type ?? []].flat(), one));
  if (typeof value === 'number') return types.includes('number') && isWithin(value, wanted);
  if (typeof value !== 'string' || !types.includes('string')) return types.includes(typeof value);
  if (wanted.format === 'date') return isDate(value);
  if (wanted.format === 'period') return parsePeriod(value) !== null;
  return new RegExp(wanted.pattern ?? '', 'u').test(value);
}

/** A list whose schema only names what it holds may hold anything. */
function isOf(types: readonly string[], value: unknown): boolean {
  return types.length === 0 || types.includes(typeof value);
}

function isWithin(
  value: number,
  {
    minimum = -Infinity,
    maximum = Infinity,
    exclusiveMinimum = -Infinity,
    exclusiveMaximum = Infinity,
  }: Wanted,
): boolean {
  return value >= minimum && value <= maximum && value > exclusiveMinimum && value < exclusiveMaximum;
}
