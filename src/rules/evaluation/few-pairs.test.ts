import { editColumn } from '../../../tests/harness/columns.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { evaluationFewPairs } from './few-pairs.ts';

const target = 'evaluation.outlet-flow';
const missing = (isMissing: (date: string) => boolean) => ({
  'data/flow.csv': editColumn('flow_m3s', (date, flow) =>
    isMissing(date) || Number.isNaN(flow) ? 'NA' : flow,
  ),
});

ruleCases(evaluationFewPairs, {
  fires: [
    {
      name: 'a gauge that stands still each summer',
      files: missing((date) => ['06', '07', '08'].includes(date.slice(5, 7))),
      finds: [
        {
          record: target,
          field: `${target}.scores.calibration`,
          subject: 'calibration',
          level: 'warn',
          // 92 days of four summers and the two days of March 2004 that sound-files.ts leaves out: 1461 - 368 - 2.
          found: Number((1091 / 1461).toFixed(3)),
          message: 'scored on 1 091 of 1 461 steps: 370 lack the observation, 0 the simulation, 0 both',
        },
        { subject: 'validation' },
      ],
    },
    {
      name: 'a year of months',
      set: { [`${target}.step`]: 'P1M', 'periods.calibration': ['2003-10-01/2004-09-30'] },
      finds: { subject: 'calibration', found: 12, unit: 'pairs', message: '12 of 12 steps' },
    },
    {
      name: 'a simulation that ends early',
      files: {
        'runs/calibrated/daily.csv': (old) => old.replace(/^20(?:09|10)-.*\n/gm, ''),
      },
      // 2009-01-01 to 2010-09-30.
      finds: { subject: 'validation', message: '0 lack the observation, 638 the simulation' },
    },
  ],
  silent: [
    { name: 'one day in five missing', files: missing((date) => /[05]$/.test(date)) },
    {
      name: 'two years of months',
      set: { [`${target}.step`]: 'P1M', 'periods.calibration': ['2003-10-01/2005-09-30'] },
    },
    { name: 'nothing to pair', set: { [`${target}.simulated.values`]: 'runoff' } },
  ],
});
