import { defined, isDefined, type Statistic, undefinedBecause } from '../../hydrology/paired.ts';
import { ambiguous, type KnownUnit, names, prefixNames, prefixSymbols, symbols } from './known-units.ts';
import { dimensionless, sameDimension, times, type Unit } from './unit.ts';

const superscripts = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/**
 * Reads a unit as the CF conventions and the trade write it: `mm d-1`, `mm/d`, `m3 s-1`, `m^3/s`, `m³ s⁻¹`, `kg m-2 per day`, `1e6 m3`,
 * `ML/d`, `cumec`, `degC`. Factors of a product are parted by a blank, a point, `*` or a hyphen between letters; a solidus
 * divides by the next factor only; powers are whole numbers. Undefined for what is no unit, and for texts that
 * people read in two ways (`a`, `Mm3`, `ton`).
 * Source: grammar and factors of UDUNITS-2, on which the CF conventions rest (section 3.1).
 */
export function parseUnit(text: string): Statistic<Unit> {
  const plain = plainly(text);
  if (plain === '') return undefinedBecause('no unit is stated');
  const parser = new Parser(plain);
  const unit = parser.product();
  if (!isDefined(unit)) return unit;
  if (!parser.atEnd) return undefinedBecause(`"${text}" ${parser.stuck()}`);
  return defined({ ...unit.value, text });
}

/** Superscripts, middle points, long minus signs and micro signs as ASCII writes them. */
function plainly(text: string): string {
  return text
    .trim()
    .replaceAll(/⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]+/g, (power) =>
      power.replace('⁻', '-').replaceAll(/[^-]/g, (digit) => String(superscripts.indexOf(digit))),
    )
    .replaceAll(/[·⋅×]/g, '*')
    .replaceAll('−', '-')
    .replaceAll(/[µμ]/g, 'u')
    .replaceAll(/\bdeg(?:rees?)? C(?:elsius)?\b/g, 'degC');
}

const one: Unit = { text: '1', factor: 1, offset: 0, dimension: dimensionless };

class Parser {
  private readonly text: string;
  private at = 0;

  constructor(text: string) {
    this.text = text;
  }

  get atEnd(): boolean {
    return this.at === this.text.length;
  }

  /** Where the text stops being a unit. */
  stuck(): string {
    if (this.atEnd) return 'ends where a unit should follow';
    return `can't be read as a unit from "${this.text.slice(this.at).trim()}" on`;
  }

  product(): Statistic<Unit> {
    let unit = this.factor();
    while (isDefined(unit) && !this.atEnd) {
      const sign = this.take(/\s*(\/|\*(?!\*)|\.|-(?=[A-Za-z])|per\b)\s*|\s+(?![\d/*.)]|per\b)/iy);
      if (sign === null) break;
      const next = this.factor();
      if (!isDefined(next)) return next;
      const divides = sign[1] === '/' || sign[1]?.toLowerCase() === 'per';
      unit = defined(divides ? times(unit.value, next.value, -1) : multiplied(unit.value, next.value));
    }
    return unit;
  }

  /** A number, a symbol or a product in brackets, with its power. */
  private factor(): Statistic<Unit> {
    let base: Statistic<Unit>;
    const number = this.take(/\d+(?:\.\d+)?(?:e[+-]?\d+)?|\.\d+/iy);
    const word = number === null ? this.take(/[A-Za-z_]+|[°%][A-Za-z]*/y) : null;
    if (number !== null) base = defined({ ...one, factor: Number(number[0]) });
    else if (word !== null) base = unitNamed(word[0]);
    else if (this.take(/\(\s*/y) !== null) {
      base = this.product();
      if (isDefined(base) && this.take(/\s*\)/y) === null)
        return undefinedBecause(`"${this.text}" opens a bracket that it does not close`);
    } else return undefinedBecause(`"${this.text}" ${this.stuck()}`);
    if (!isDefined(base)) return base;
    const power = this.take(number === null ? /(?:\^|\*\*)?([+-]?\d+)/y : /(?:\^|\*\*)([+-]?\d+)/y);
    if (power === null) return base;
    const exponent = Number(power[1]);
    if (Math.abs(exponent) > 12) return undefinedBecause(`"${this.text}" has a power of ${exponent}`);
    return defined(exponent === 1 ? base.value : times(one, base.value, exponent));
  }

  private take(pattern: RegExp): RegExpExecArray | null {
    pattern.lastIndex = this.at;
    const found = pattern.exec(this.text);
    if (found !== null) this.at = pattern.lastIndex;
    return found;
  }
}

/** Tenths of a degree (`0.1 degC`) still count from the freezing point; in other products an offset has no meaning. */
function multiplied(one: Unit, other: Unit): Unit {
  if (other.offset !== 0 && sameDimension(one.dimension, dimensionless))
    return { ...other, factor: one.factor * other.factor };
  return times(one, other, 1);
}

function unitNamed(word: string): Statistic<Unit> {
  const doubt = ambiguous.get(word) ?? ambiguous.get(word.replace(/s$/, ''));
  if (doubt !== undefined) return undefinedBecause(`"${word}" is read in two ways: ${doubt}`);
  const known = unprefixed(word);
  if (known !== undefined) return defined(asUnit(word, known, 1));
  for (const [prefix, size] of prefixNames) {
    const name = word.toLowerCase();
    const found = name.startsWith(prefix) ? named(name.slice(prefix.length)) : undefined;
    if (found !== undefined) return defined(asUnit(word, found, size));
  }
  for (const [prefix, size] of prefixSymbols) {
    const found = word.startsWith(prefix) ? symbols.get(word.slice(prefix.length)) : undefined;
    if (found !== undefined) return defined(asUnit(word, found, size));
  }
  return undefinedBecause(`"${word}" is no unit that UDUNITS or the trade knows`);
}

function unprefixed(word: string): KnownUnit | undefined {
  return symbols.get(word) ?? named(word.toLowerCase());
}

function named(name: string): KnownUnit | undefined {
  return names.get(name) ?? names.get(name.replace(/s$/, ''));
}

function asUnit(text: string, known: KnownUnit, size: number): Unit {
  return { text, factor: known.factor * size, offset: known.offset ?? 0, dimension: known.dimension };
}
