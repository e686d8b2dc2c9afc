import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { evaluationSingleScore } from './single-score.ts';

const scores = 'evaluation.outlet-flow.scores';

ruleCases(evaluationSingleScore, {
  fires: [
    {
      name: 'NSE alone',
      set: { [`${scores}.calibration`]: { nse: 0.966 } },
      finds: {
        record: 'evaluation.outlet-flow',
        field: `${scores}.calibration`,
        subject: 'calibration',
        level: 'block',
        message: /\(NSE\) say nothing of bias .*, nor of agreement in time/,
      },
    },
    {
      name: 'no bias; that of high flows is none of the whole',
      set: { [`${scores}.validation`]: { nse: 0.967, r2: 0.995, fhv: -7.2 } },
      finds: { subject: 'validation', message: 'say nothing of bias (such as PBIAS).' },
    },
    {
      name: 'in a table',
      set: { [scores]: { table: 'runs/scores.csv' } },
      files: { 'runs/scores.csv': 'window,score,value\ncalibration,r2,0.995\n' },
      finds: { message: '(R2) say nothing of the size of errors' },
    },
  ],
  silent: [
    {
      name: 'KGE for agreement',
      set: { [`${scores}.calibration`]: { rmse: 0.0756, beta: 0.922, kge: 0.903 } },
    },
    { name: 'no scores, which is another rule’s', remove: [scores] },
  ],
});
