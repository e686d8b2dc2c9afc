import { editColumn } from '../../../tests/harness/columns.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { evaluationWorseThanMean } from './worse-than-mean.ts';

const target = 'evaluation.outlet-flow';
const simulated = (change: (date: string, flow: number) => number) => ({
  'runs/calibrated/daily.csv': editColumn('flow_m3s', change),
});

ruleCases(evaluationWorseThanMean, {
  fires: [
    {
      name: 'a flow of nothing: NSE = -(mean / deviation) squared, KGE without r',
      files: simulated(() => 0),
      finds: [
        {
          record: target,
          field: `${target}.scores.calibration`,
          subject: 'calibration',
          level: 'block',
          message: /no better than the mean of the observations: NSE is -\d.*0 is what the mean reaches\.$/,
        },
        { subject: 'validation' },
      ],
    },
    {
      name: 'a season upside down',
      files: simulated((_, flow) => 4 - 3 * flow),
      finds: [{ message: 'KGE is -' }, { message: '-0.41 is what the mean reaches' }],
    },
    {
      name: 'as stated, where nothing can be recomputed',
      set: { [`${target}.simulated.values`]: 'runoff', [`${target}.scores.validation.kge`]: -0.5 },
      finds: { subject: 'validation', message: 'KGE is -0.5' },
    },
    {
      name: 'only noted while calibrating',
      files: simulated(() => 0),
      phase: 'calibration',
      finds: [{ level: 'note' }, { level: 'note' }],
    },
  ],
  silent: [
    {
      name: 'KGE between -0.41 and 0 still beats the mean',
      set: {
        [`${target}.simulated.values`]: 'runoff',
        [`${target}.scores`]: { calibration: { kge: -0.41 }, validation: { kge: -0.3 } },
      },
    },
  ],
});
