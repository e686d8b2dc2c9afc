import type { Condition, Driver, ManifestData } from '../../manifest/data.generated.ts';
import { dayNumber, parsePeriod } from '../../manifest/period.ts';
import type { RecordNode, Records } from '../../records/record.ts';
import type { Window } from '../../series/calendar.ts';

/** Days over which a quantity is looked at. */
export interface Days {
  readonly windows: readonly Window[];
  readonly leftOut: readonly Window[];
}

/** The calibration, unless another window is stated. */
export function daysOfCondition({ over = 'calibration' }: Condition, { manifest }: Records): Days {
  return daysOver(over, manifest.data);
}

/** The simulation of the driver's run, or else the case's, after warm-up, unless another window is stated; all days where none is known. */
export function daysOfDriver(driver: Driver, ofCase: string | undefined, { manifest, nodes }: Records): Days {
  if (driver.over !== undefined) return daysOver(driver.over, manifest.data);
  const run = nodes.get(`runs.${driver.run ?? ofCase}`) as RecordNode<'runs'> | undefined;
  const { periods } = manifest.data;
  const windows = daysIn(run?.fragment.simulation ?? periods?.simulation);
  const leftOut = daysIn(run?.fragment.warm_up ?? periods?.warm_up);
  return { windows: windows.length > 0 ? windows : [allDays], leftOut };
}

const allDays: Window = { firstDay: dayNumber('0000-01-01'), lastDay: dayNumber('9999-12-31') };

function daysOver(over: string, { periods }: ManifestData): Days {
  const leftOut = daysIn(periods?.warm_up);
  if (over === 'simulation') return { windows: daysIn(periods?.simulation), leftOut };
  if (over === 'calibration' || over === 'validation')
    return { windows: (periods?.[over] ?? []).flatMap(daysIn), leftOut };
  return { windows: daysIn(over), leftOut: [] };
}

function daysIn(text: unknown): readonly Window[] {
  const period = typeof text === 'string' ? parsePeriod(text) : null;
  return period === null ? [] : [{ firstDay: dayNumber(period.first), lastDay: dayNumber(period.last) }];
}
