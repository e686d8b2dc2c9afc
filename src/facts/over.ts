import { defined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import type { ManifestData } from '../manifest/data.generated.ts';
import type { RecordNode } from '../records/record.ts';
import { parseWindow, type Window } from '../series/calendar.ts';
import { daysOf } from './scores/pairings.ts';
import type { StatedWindow } from './windows.ts';

/** Days over which something is added up or counted. */
export interface Days {
  readonly windows: readonly Window[];
  /** The warm-up: no figure holds it. */
  readonly leftOut: readonly Window[];
}

/**
 * The days that a record means by `over`: `calibration` and `validation` as `stated`, `simulation` as the run or the study says, or a
 * period. Undefined where no such window is stated.
 */
export function daysOver(
  over: string,
  run: RecordNode<'runs'> | undefined,
  stated: readonly StatedWindow[],
  { periods }: ManifestData,
): Statistic<Days> {
  const windows =
    over === 'calibration' || over === 'validation'
      ? daysOf(stated, over)
      : [parseWindow(over === 'simulation' ? (run?.fragment.simulation ?? periods?.simulation ?? '') : over)];
  const known = windows.filter((window) => window !== null);
  return known.length === 0
    ? undefinedBecause(`no ${over} window is stated`)
    : defined({ windows: known, leftOut: daysOf(stated, 'warm-up') });
}
