import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { evaluationIdentityBroken } from './identity-broken.ts';

const scores = 'evaluation.outlet-flow.scores';
const calibration = `${scores}.calibration`;

// The identities follow from the formulas of Moriasi et al. 2007, eqs. 1-3; sqrt(1 - 0.66) = 0.583.
ruleCases(evaluationIdentityBroken, {
  fires: [
    {
      name: 'NSE above r squared',
      set: { [calibration]: { nse: 0.85, r2: 0.81 } },
      finds: {
        record: 'evaluation.outlet-flow',
        field: `${calibration}.nse`,
        subject: 'calibration NSE <= r^2 nse r2',
        level: 'block',
        message: 'NSE 0.85, R2 0.81; NSE is never above r squared',
      },
    },
    {
      name: 'RSR that is not that of NSE',
      set: { [calibration]: { nse: 0.66, rsr: 0.62 } },
      finds: { message: 'RSR is the square root of 1 - NSE' },
    },
    {
      name: 'PBIAS with the other sign than the ratio of means',
      set: { [`${scores}.validation`]: { pbias: 10, beta: 1.1 } },
      finds: { field: `${scores}.validation.pbias`, message: 'positive where the model gives too little' },
    },
    {
      name: 'a correlation above 1',
      set: { [calibration]: { r: 1.2 } },
      finds: { message: 'r 1.2; it can’t have that value' },
    },
    {
      name: 'in a table',
      set: { [scores]: { table: 'runs/scores.csv' } },
      files: { 'runs/scores.csv': 'window,score,value\ncalibration,r2,0.80\ncalibration,nse,0.85\n' },
      finds: { file: 'runs/scores.csv', line: 3 },
    },
  ],
  silent: [
    { name: 'rounded alike', set: { [calibration]: { nse: 0.66, rsr: 0.58, r2: 0.66 } } },
    { name: 'two windows', set: { [calibration]: { nse: 0.9 }, [`${scores}.validation`]: { r2: 0.8 } } },
  ],
});
