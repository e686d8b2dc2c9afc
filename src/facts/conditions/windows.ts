import type { Statistic } from '../../hydrology/paired.ts';
import type { Condition, Driver } from '../../manifest/data.generated.ts';
import type { RecordNode, Records } from '../../records/record.ts';
import { type Days, daysOver } from '../over.ts';
import { windowsOfRun } from '../windows.ts';

/** The calibration, unless another window is stated. */
export function daysOfCondition({ over = 'calibration', run }: Condition, records: Records): Statistic<Days> {
  return daysOf(over, run, records);
}

/** The simulation of the driver's run, or else the case's, without its warm-up, unless another window is stated. */
export function daysOfDriver(
  { over = 'simulation', run }: Driver,
  ofCase: string | undefined,
  records: Records,
): Statistic<Days> {
  return daysOf(over, run ?? ofCase, records);
}

function daysOf(over: string, name: string | undefined, records: Records): Statistic<Days> {
  const run = records.nodes.get(`runs.${name}`) as RecordNode<'runs'> | undefined;
  return daysOver(over, run, windowsOfRun(run, records), records.manifest.data);
}
