import type { Area } from '../../records/record.ts';
import type { Draft } from '../rule.ts';

/**
 * Records whose seal is asked for from the calibration on: what a calibration stands on. Of a study in calibration all else
 * (parameters, runs, scores ...) changes hourly, so its seals are asked for from the validation on.
 */
const early: ReadonlySet<Area> = new Set(['study', 'catchment', 'model', 'inputs', 'periods']);

/** From which phase a fault of a record's seal blocks, where that is not the calibration. */
export function fromPhase(area: Area): Pick<Draft, 'from'> {
  return early.has(area) ? {} : { from: 'validation' };
}
