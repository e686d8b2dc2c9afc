import { parseDate, parseWindow, type Window } from '../../src/series/calendar.ts';
import type { Series } from '../../src/series/series.ts';
import type { Step } from '../../src/series/step.ts';

/** Seconds of `2010-01-31` or `2010-01-31T06`. */
export function at(text: string): number {
  const [date = '', hour = '0'] = text.split('T');
  return (parseDate(date) ?? Number.NaN) * 86_400 + Number(hour) * 3600;
}

/** A series of values at ISO dates, or dates and hours; null where missing. */
export function seriesOf(step: Step, values: Readonly<Record<string, number | null>>, unit = 'mm'): Series {
  return {
    unit,
    step,
    timeSeconds: Float64Array.from(Object.keys(values), at),
    values: Float64Array.from(Object.values(values), (value) => value ?? Number.NaN),
  };
}

/** The other way round: values by time in seconds from 1970, or by date where `by` says how to write one. */
export function entriesOf(
  series: Series,
  by: (timeSeconds: number) => string,
): Record<string, number | null> {
  return Object.fromEntries(
    Array.from(series.timeSeconds, (time, row) => {
      const value = series.values[row] ?? Number.NaN;
      return [by(time), Number.isNaN(value) ? null : value];
    }),
  );
}

export function windowOf(text: string): Window {
  const window = parseWindow(text);
  if (window === null) throw new Error(`${text} is no window`);
  return window;
}
