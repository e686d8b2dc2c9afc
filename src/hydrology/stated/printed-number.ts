/** A number as somebody printed it. */
export interface PrintedNumber {
  readonly value: number;
  /** Digits after the point, trailing zeros counted: 2 for 0.70; negative for tens and above, as in 1e3. */
  readonly decimals: number;
}

/**
 * A number with the decimals it was printed with.
 *
 * Formula: digits after the point, less the exponent of ten
 * Inputs: the number as text, with a decimal point.
 * Range: null for text that is no number.
 * Read: 0.70 claims more than 0.7; take the text of the file, not the number it was parsed to.
 * Undefined: see range.
 * Source: definition.
 * Example: printedNumber('-0.70') -> {value: -0.7, decimals: 2}
 */
export function printedNumber(text: string): PrintedNumber | null {
  const parts = /^[+-]?(?:\d+(?:\.(\d*))?|\.(\d+))(?:e([+-]?\d+))?$/i.exec(text.trim());
  if (!parts) return null;
  const decimals = (parts[1] ?? parts[2] ?? '').length - Number(parts[3] ?? 0);
  return { value: Number(text), decimals };
}

/**
 * The values that print as the stated one does.
 *
 * Formula: value plus and minus half a unit of its last decimal
 * Inputs: the printed number, any unit.
 * Range: lowest and highest, both included.
 * Read: the stated and the recomputed figure agree when the recomputed one, unrounded, lies inside.
 * Undefined: never.
 * Source: definition of rounding.
 * Example: printedInterval({value: 0.78, decimals: 2}) -> {lowest: 0.775, highest: 0.785}
 */
export function printedInterval(stated: PrintedNumber): {
  readonly lowest: number;
  readonly highest: number;
} {
  const half = 0.5 * 10 ** -stated.decimals;
  // A decimal half is rarely a binary one: 0.785 computed must not fall outside 0.78 +- 0.005 by its last bit.
  const slack = 4 * Number.EPSILON * Math.max(Math.abs(stated.value), half);
  return { lowest: stated.value - half - slack, highest: stated.value + half + slack };
}

/**
 * Whether a recomputed figure is the stated one within its printed decimals.
 *
 * Formula: lowest <= recomputed <= highest of `printedInterval`
 * Inputs: both figures in one unit, the recomputed one unrounded.
 * Range: true or false.
 * Read: a half rounds either way, so both neighbours agree with it.
 * Undefined: a figure that is no number agrees with nothing.
 * Source: definition.
 * Example: agreesAsPrinted({stated: {value: 0.78, decimals: 2}, recomputed: 0.7761}) -> true
 */
export function agreesAsPrinted(of: {
  readonly stated: PrintedNumber;
  readonly recomputed: number;
}): boolean {
  const { lowest, highest } = printedInterval(of.stated);
  return of.recomputed >= lowest && of.recomputed <= highest;
}
