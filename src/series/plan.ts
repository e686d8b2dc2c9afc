import type { ColumnReference, SeriesLayout } from './layout.ts';
import { type MissingCodes, missingCodes } from './missing-codes.ts';
import { comma, point } from './number-text.ts';
import { parseStep, type Step } from './step.ts';
import { type TimeReader, timeReader } from './time-reader.ts';

/** A layout ready for reading. */
export interface Plan {
  readonly step: Step | null;
  readonly time: TimeReader;
  readonly values: readonly ColumnReference[];
  readonly separator: 'comma' | 'semicolon' | 'tab' | 'blank';
  readonly decimalMark: number;
  readonly missing: MissingCodes;
}

/** A text says why the layout can't be used. */
export function planOf(layout: SeriesLayout): Plan | string {
  const step = layout.step === undefined ? null : parseStep(layout.step);
  if (step === null && layout.step !== undefined)
    return `step "${layout.step}" is neither "irregular" nor a whole ISO 8601 duration such as P1D, PT15M or P1M`;
  if (layout.time === undefined) return 'no column of the time is stated';
  if (layout.values === undefined) return 'no column of values is stated';
  const time = timeReader(layout.time, step, layout.utc_offset);
  if (typeof time === 'string') return time;
  const decimalMark = layout.decimal === 'comma' ? comma : point;
  return {
    step,
    time,
    values: typeof layout.values === 'object' ? layout.values : [layout.values],
    separator: layout.separator ?? 'comma',
    decimalMark,
    missing: missingCodes(layout.missing, decimalMark),
  };
}
