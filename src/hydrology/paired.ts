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

export function defined<T>(value: T): { readonly value: T } {
  return { value };
}

export function undefinedBecause(reason: string): { readonly undefined: string } {
  return { undefined: reason };
}

export function isDefined<T>(statistic: Statistic<T>): statistic is { readonly value: T } {
  return 'value' in statistic;
}

/** A value that may be missing, as readers hand it over. */
export type Value = number | null;

/**
 * Pairs two lists that already stand step beside step, one step a day from 1970-01-01: a pair is dropped when either
 * member is missing or not finite. For series of equal steps without dates, and for tests.
 * Throws a RangeError when the lists differ in length.
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

/** Share of the window's steps that gave a pair, 0 to 1; undefined for a window without steps. */
export function pairedShare(paired: Paired): Statistic {
  if (paired.windowSteps === 0) return undefinedBecause('the window holds no steps');
  return defined(paired.observed.length / paired.windowSteps);
}

function finite(value: Value | undefined): Value {
  return value === undefined || value === null || !Number.isFinite(value) ? null : value;
}
