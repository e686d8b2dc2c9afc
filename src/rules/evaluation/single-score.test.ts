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
        level: 'block',
        message: /\(NSE\) say nothing of bias .*, nor of agreement in time/,
      },
    },
    {
      name: 'no bias; that of high flows is none of the whole',
      set: { [`${scores}.validation`]: { nse: 0.967, r2: 0.995, fhv: -7.2 } },
      finds: { field: `${scores}.validation`, message: 'say nothing of bias (such as PBIAS).' },
    },
    {
      name: 'one kind lacking in both windows',
      set: {
        [`${scores}.calibration`]: { nse: 0.966, r2: 0.995 },
        [`${scores}.validation`]: { nse: 0.967, kge: 0.9 },
      },
      finds: {
        field: `${scores}.calibration`,
        message:
          'The calibration and validation scores of outlet-flow (NSE, R2, KGE) say nothing of bias (such as PBIAS).',
      },
    },
    {
      name: 'one kind lacking in one window, another in the other',
      set: {
        [`${scores}.calibration`]: { nse: 0.966, r2: 0.995 },
        [`${scores}.validation`]: { pbias: 7.9, kge: 0.9 },
      },
      finds: { message: /The calibration scores .* bias .*\. The validation scores .* size of errors .*\.$/ },
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
