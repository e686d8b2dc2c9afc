/** Steps of the window that give no pair, by cause. */
export interface Dropped {
  /** The observation is missing or not finite, the simulation is there. */
  readonly missingObserved: number;
  /** The simulation is missing or not finite, the observation is there. */
  readonly missingSimulated: number;
  readonly missingBoth: number;
  /** Steps that one of the two files holds before or after the window; not counted in `windowSteps`. */
  readonly outsideWindow: number;
}

/**
 * Observed and simulated values of the same steps, in order of time, every one finite. All three arrays have one
 * length. The series room builds them; nothing here pairs by date.
 */
export interface Paired {
  readonly observed: Float64Array;
  readonly simulated: Float64Array;
  /** Start of each step on the file's own clock, in days since 1970-01-01T00:00; whole numbers for daily and longer steps. */
  readonly times: Float64Array;
  readonly dropped: Dropped;
  /** Steps that the window would hold if nothing were missing. */
  readonly windowSteps: number;
}

/** A value, or the reason in words why there is none. Never NaN, never a stand-in number. */
export type Statistic<T = number> = { readonly value: T } | { readonly undefined: string };

/** Example: defined('wet') -> {value: 'wet'} */
export function defined<T>(value: T): { readonly value: T } {
  return { value };
}

/** Example: undefinedBecause('no pairs') -> {undefined: 'no pairs'} */
export function undefinedBecause(reason: string): { readonly undefined: string } {
  return { undefined: reason };
}

/** Example: isDefined(undefinedBecause('no pairs')) -> false */
export function isDefined<T>(statistic: Statistic<T>): statistic is { readonly value: T } {
  return 'value' in statistic;
}

/**
 * A computed number; a reason instead when the arithmetic left the range of numbers.
 * Example: computed(Number.POSITIVE_INFINITY) -> {undefined: 'the values are too large or too small to compute with'}
 */
export function computed(value: number): Statistic {
  return Number.isFinite(value)
    ? { value }
    : undefinedBecause('the values are too large or too small to compute with');
}

/**
 * Several numbers computed together; the same reason when one of them is no finite number.
 * Example: computedTogether({slope: 1, r: 0.5}) -> {value: {slope: 1, r: 0.5}}
 */
export function computedTogether<T extends object>(parts: T): Statistic<T> {
  for (const part of Object.values(parts)) {
    if (typeof part !== 'number') continue;
    const checked = computed(part);
    if (!isDefined(checked)) return checked;
  }
  return defined(parts);
}

/** A value that may be missing, as readers hand it over. */
export type Value = number | null;

/**
 * Pairs two lists that already stand step beside step, one step a day from 1970-01-01: a pair is dropped when either
 * member is missing or not finite. For series of equal steps without dates, and for tests.
 * Throws a RangeError when the lists differ in length.
 * Example: pairInOrder({observed: [1, null, 3], simulated: [2, 2, 4]}).dropped.missingObserved -> 1
 */
export function pairInOrder(sides: {
  readonly observed: ArrayLike<Value>;
  readonly simulated: ArrayLike<Value>;
}): Paired {
  const { observed, simulated } = sides;
  if (observed.length !== simulated.length)
    throw new RangeError(
      `${observed.length} observed and ${simulated.length} simulated values cannot be paired`,
    );
  const kept: { observed: number; simulated: number; time: number }[] = [];
  const dropped = { missingObserved: 0, missingSimulated: 0, missingBoth: 0, outsideWindow: 0 };
  for (let step = 0; step < observed.length; step++) {
    const o = finite(observed[step]);
    const s = finite(simulated[step]);
    if (o !== null && s !== null) kept.push({ observed: o, simulated: s, time: step });
    else if (o !== null) dropped.missingSimulated++;
    else if (s !== null) dropped.missingObserved++;
    else dropped.missingBoth++;
  }
  return {
    observed: Float64Array.from(kept, (pair) => pair.observed),
    simulated: Float64Array.from(kept, (pair) => pair.simulated),
    times: Float64Array.from(kept, (pair) => pair.time),
    dropped,
    windowSteps: observed.length,
  };
}

/**
 * Share of the window's steps that gave a pair, 0 to 1; undefined for a window without steps.
 * Example: pairedShare(pairInOrder({observed: [1, null], simulated: [2, 2]})) -> {value: 0.5}
 */
export function pairedShare(paired: Paired): Statistic {
  if (paired.windowSteps === 0) return undefinedBecause('the window holds no steps');
  return defined(paired.observed.length / paired.windowSteps);
}

function finite(value: Value | undefined): Value {
  return value === undefined || value === null || !Number.isFinite(value) ? null : value;
}
