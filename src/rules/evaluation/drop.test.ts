import { editColumn } from '../../../tests/harness/columns.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { evaluationDrop } from './drop.ts';

const target = 'evaluation.outlet-flow';
const halved = {
  'runs/calibrated/daily.csv': editColumn('flow_m3s', (date, flow) =>
    date >= '2007-10-01' ? flow / 2 : flow,
  ),
};
const stated = (calibration: number, validation: number) => ({
  [`${target}.simulated.values`]: 'runoff',
  [`${target}.scores`]: { calibration: { nse: calibration }, validation: { nse: validation } },
});

ruleCases(evaluationDrop, {
  fires: [
    {
      name: 'half the water in the validation',
      files: halved,
      finds: {
        record: target,
        field: `${target}.scores`,
        level: 'warn',
        message: /outlet-flow loses much: NSE falls from 0\.9656 to .*, KGE falls from 0\.9029 to/,
      },
    },
    {
      name: 'as stated, where nothing can be recomputed',
      set: stated(0.8, 0.59),
      finds: { message: 'NSE falls from 0.8 to 0.59' },
    },
    {
      name: 'a regulator who allows less',
      set: {
        ...stated(0.8, 0.7),
        departures: [{ threshold: 'evaluation.drop', now: 0.05, because: 'requirement 4.2' }],
      },
      finds: { level: 'warn' },
    },
  ],
  silent: [
    { name: 'a little less', set: stated(0.8, 0.61) },
    { name: 'better than the calibration', set: stated(0.6, 0.9) },
    { name: 'one window only', files: halved, remove: ['periods.validation', `${target}.scores.validation`] },
  ],
});
