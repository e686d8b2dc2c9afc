import { rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';
import { calibratedCount } from './calibrated.ts';

export const parametersSensitivityMissing = rule({
  id: 'parameters.sensitivity-missing',
  scope: 'parameters',
  from: 'validation',
  means: 'incomplete',
  statement: 'There is no sensitivity analysis of the calibrated parameters, nor a reason for its absence.',
  why: 'Which parameters matter, and which could have been anything, decides what the model can be asked.',
  source: {
    basis: 'practice',
    citation: 'Common practice before and after calibration; asked for by most modelling guidelines.',
  },
  clear: 'State `sensitivity.method` and the file of its results, or `sensitivity.none_because`.',
  check: ({ id, fragment: { sensitivity } }, { parameters }) => {
    if (calibratedCount(parameters.values) === 0 || isStated(sensitivity?.none_because)) return [];
    const isDone = isStated(sensitivity?.method);
    if (isDone && sensitivity?.file !== undefined) return [];
    return [
      {
        record: id,
        field: ['parameters', 'sensitivity'],
        ...(isDone ? { from: 'warn' as const, subject: 'file' } : {}),
        message: isDone
          ? 'The sensitivity analysis names no file with its results.'
          : 'Nothing says how sensitive the results are to the calibrated parameters.',
      },
    ];
  },
});
