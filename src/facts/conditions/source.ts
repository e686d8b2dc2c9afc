import { isDefined, type Statistic } from '../../hydrology/paired.ts';
import type { Condition, Driver } from '../../manifest/data.generated.ts';
import type { Records } from '../../records/record.ts';
import type { Snapshot } from '../../repository/snapshot.ts';
import { convertSeries, type Over } from '../../series/convert-series.ts';
import type { Series } from '../../series/series.ts';
import { findInput, readInputSeries, type Unusable } from '../input.ts';
import { findOutput, readOutputSeries } from '../output.ts';

/** The series behind a condition or a driver, and all that it depends on. */
export interface ConditionSource {
  /** Layouts, files and their digests; JSON. */
  readonly from: unknown;
  /** In the unit asked for; as it stands where none is, or the file's own is not stated. */
  read(unit: string | undefined, over: Over): Promise<Statistic<Series>>;
}

export async function sourceOf(
  stated: Condition | Driver,
  records: Records,
  snapshot: Snapshot,
): Promise<{ readonly value: ConditionSource } | Unusable> {
  const { input, file, values } = stated;
  const inUnit = (series: Statistic<Series>, unit: string | undefined, over: Over) =>
    isDefined(series) && unit !== undefined && series.value.unit !== ''
      ? convertSeries(series.value, unit, over)
      : series;
  if (input !== undefined) {
    const reference = {
      input,
      ...(file === undefined ? {} : { file }),
      ...(values === undefined ? {} : { values }),
    };
    const found = findInput(reference, records);
    if ('undefined' in found) return found;
    return {
      value: {
        from: found.value.from,
        read: async (unit, over) => inUnit(await readInputSeries(found.value, records, snapshot), unit, over),
      },
    };
  }
  const found = await findOutput(stated, records, snapshot);
  if ('undefined' in found) return found;
  return {
    value: {
      from: found.value,
      read: async (unit, over) => inUnit(await readOutputSeries(found.value, snapshot), unit, over),
    },
  };
}
