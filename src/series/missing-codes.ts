import type { SeriesLayout } from './layout.ts';
import { numberOf } from './number-text.ts';

/** Declared codes of missing values, ready to be compared. */
export interface MissingCodes {
  readonly texts: ReadonlySet<string>;
  /** Few, and asked for every value: a plain list is several times quicker than a set of numbers (measured). */
  readonly numbers: readonly number[];
}

/** A text that reads as a number with this decimal mark counts as that number too. */
export function missingCodes(declared: SeriesLayout['missing'], decimalMark: number): MissingCodes {
  const texts = new Set<string>();
  const numbers: number[] = [];
  for (const code of declared ?? []) {
    if (typeof code === 'number') numbers.push(code);
    else {
      texts.add(code.trim());
      const number = numberOf(code.trim(), decimalMark);
      if (!Number.isNaN(number)) numbers.push(number);
    }
  }
  return { texts, numbers };
}

/**
 * Whether a number is one that data sets customarily write for a missing value: negative and all nines, such as -9.9, -99,
 * -99.9, -999 or -9999 (practice; no published list).
 */
export function isCustomaryMissingCode(value: number): boolean {
  return value < 0 && /^-9+(\.9+)?$/.test(String(value));
}

/** The same, and no value that any series of a catchment holds: -999 and below. */
export function isNoPlausibleValue(value: number): boolean {
  return value <= -999 && isCustomaryMissingCode(value);
}
