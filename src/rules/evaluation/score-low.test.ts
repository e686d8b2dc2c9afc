import { expect } from 'vitest';
import { editColumn } from '../../../tests/harness/columns.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { evaluationScoreLow } from './score-low.ts';

const target = 'evaluation.outlet-flow';
const times = (factor: number) => ({
  'runs/calibrated/daily.csv': editColumn('flow_m3s', (_, flow) => flow * factor),
});
/** A fifth less flow: PBIAS is 100 (1 - 0.8 x 0.922) = 26 %, while NSE and R2 stay above their limits. */
const low = times(0.8);
const monthly = { [`${target}.step`]: 'P1M', [`${target}.rated_by`]: 'moriasi-2007-monthly-flow' };

ruleCases(evaluationScoreLow, {
  fires: [
    {
      name: 'daily flow warns, and the lowest class governs',
      files: low,
      finds: ['calibration', 'validation'].map((window) => ({
        record: target,
        field: `${target}.scores.${window}`,
        subject: window,
        level: 'warn' as const,
        found: 'unsatisfactory',
        message:
          /unsatisfactory by moriasi-2015-daily-flow: PBIAS is 26\.\d+ \(satisfactory is within 15 %\)\.$/,
        detail: [
          expect.stringMatching(
            /^NSE 0\.\d+ satisfactory, PBIAS 26\.\d+ unsatisfactory, R2 0\.99\d+ very good$/,
          ),
        ],
      })),
    },
    {
      name: 'monthly flow blocks',
      files: low,
      set: monthly,
      finds: [
        { subject: 'calibration', level: 'block', message: 'moriasi-2007-monthly-flow: PBIAS is 26' },
        { subject: 'validation', level: 'block' },
      ],
    },
    {
      name: 'monthly flow is noted while calibrating',
      files: low,
      set: monthly,
      phase: 'calibration',
      finds: [{ level: 'note' }, { level: 'note' }],
    },
    {
      name: 'a table that does not exist is replaced by the usual one',
      files: low,
      set: { [`${target}.rated_by`]: 'moriasi-2015-daily-flows' },
      finds: [
        {
          field: `${target}.rated_by`,
          subject: 'table',
          level: 'warn',
          stated: 'moriasi-2015-daily-flows',
          message:
            'no published table is called moriasi-2015-daily-flows (the nearest name is moriasi-2015-daily-flow)',
          clear: 'moriasi-2015-daily-flow',
        },
        { subject: 'calibration', message: 'by moriasi-2015-daily-flow (the usual table' },
        { subject: 'validation' },
      ],
    },
    {
      name: 'the limits of another time step',
      set: { [`${target}.rated_by`]: 'moriasi-2007-monthly-flow' },
      finds: { subject: 'table', message: 'publishes no limits for daily values of streamflow' },
    },
    {
      name: 'no table named, monthly flow: the usual one blocks all the same',
      files: low,
      set: { [`${target}.step`]: 'P1M' },
      remove: [`${target}.rated_by`],
      finds: [
        { subject: 'calibration', level: 'block', message: 'moriasi-2007-monthly-flow (the usual table' },
        { subject: 'validation', level: 'block' },
      ],
    },
    {
      name: 'stated scores where nothing can be recomputed',
      set: { [`${target}.simulated.values`]: 'runoff', [`${target}.scores.calibration.nse`]: 0.4999 },
      finds: { subject: 'calibration', message: 'NSE is 0.4999 (satisfactory is above 0.5)' },
    },
  ],
  silent: [
    { name: 'monthly flow of the sound study', set: monthly },
    {
      name: 'a step that no table is published for',
      files: low,
      set: { [`${target}.step`]: 'P1Y', [`${target}.variable`]: 'soil_water' },
      remove: [`${target}.rated_by`],
    },
  ],
});
