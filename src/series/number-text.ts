const powersOfTen = Float64Array.from({ length: 23 }, (_, power) => Number(`1e${power}`));

/** A number as modellers' files write it: sign, digits, one decimal mark, an exponent (also Fortran's `D`). */
const grammar = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eEdD][+-]?\d+)?$/;

export const point = 0x2e;
export const comma = 0x2c;

/**
 * The number that the bytes from `start` to before `end` spell out with that decimal mark; NaN where they spell none (text,
 * thousands separators, nothing, infinity). Digits that fit 53 bits over a power of ten up to 10^22 divide exactly once, which
 * rounds as the language does (Clinger 1990, "How to read floating point numbers accurately"); all others go through it.
 */
export function numberAt(bytes: Uint8Array, start: number, end: number, decimalMark: number): number {
  let at = start;
  const sign = bytes[at];
  if (sign === 0x2d || sign === 0x2b) at++;
  const firstDigit = at;
  let digits = 0;
  let places = 0;
  for (; at < end; at++) {
    const digit = (bytes[at] as number) - 48;
    if (digit < 0 || digit > 9) break;
    digits = digits * 10 + digit;
  }
  let count = at - firstDigit;
  if (at < end && bytes[at] === decimalMark) {
    const firstPlace = ++at;
    for (; at < end; at++) {
      const digit = (bytes[at] as number) - 48;
      if (digit < 0 || digit > 9) break;
      digits = digits * 10 + digit;
    }
    places = at - firstPlace;
    count += places;
  }
  if (count === 0) return Number.NaN;
  if (at < end || digits > Number.MAX_SAFE_INTEGER || places > 22)
    return numberOf(latin(bytes, start, end), decimalMark);
  const size = digits / (powersOfTen[places] as number);
  return sign === 0x2d ? -size : size;
}

/** The same for a text. */
export function numberOf(text: string, decimalMark: number): number {
  const pointed = decimalMark === comma ? text.replaceAll('.', '?').replace(',', '.') : text;
  if (!grammar.test(pointed)) return Number.NaN;
  const number = Number(pointed.replace(/[dD]/, 'e'));
  return Number.isFinite(number) ? number : Number.NaN;
}

/** Digits only, as a whole number; -1 for anything else, or more than nine of them. */
export function wholeNumberAt(bytes: Uint8Array, start: number, end: number): number {
  if (end === start || end - start > 9) return -1;
  let number = 0;
  for (let at = start; at < end; at++) {
    const digit = (bytes[at] as number) - 48;
    if (digit < 0 || digit > 9) return -1;
    number = number * 10 + digit;
  }
  return number;
}

function latin(bytes: Uint8Array, start: number, end: number): string {
  return Buffer.from(bytes.buffer, bytes.byteOffset + start, end - start).toString('latin1');
}
