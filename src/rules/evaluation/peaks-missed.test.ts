import { expect } from 'vitest';
import { editColumn } from '../../../tests/harness/columns.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { evaluationPeaksMissed } from './peaks-missed.ts';

const target = 'evaluation.outlet-flow';
const peaks = `${target}.peaks`;
/** One day of 3 m3/s on the first of each month, on a flow of a year's wave; `flat` months have none. */
const withFloods = (floods: (date: string) => boolean) => (date: string) => {
  const wave = 1 + 0.5 * Math.cos((2 * Math.PI * Number(date.slice(5, 7))) / 12);
  return date.endsWith('-01') && floods(date) ? 3 : wave;
};
const observed = {
  'data/flow.csv': editColumn(
    'flow_m3s',
    withFloods(() => true),
  ),
};
const simulated = (floods: (date: string) => boolean) => ({
  ...observed,
  'runs/calibrated/daily.csv': editColumn('flow_m3s', withFloods(floods)),
});
/** Floods of four months a year. */
const third = simulated((date) => ['01', '02', '03', '04'].includes(date.slice(5, 7)));
const needed = { 'study.needs': [{ variable: 'streamflow', regime: 'high' }] };

ruleCases(evaluationPeaksMissed, {
  fires: [
    {
      name: 'a third of the peaks hit, with an NSE that passes',
      files: third,
      set: { [peaks]: { above: 2.5, apart: 7, within: 1 } },
      finds: [
        {
          record: target,
          field: peaks,
          subject: 'calibration',
          level: 'warn',
          // Four years of twelve floods; the first of October 2003 begins the window and is no peak. Sixteen are simulated.
          found: Number((16 / 47).toFixed(3)),
          message: /hits 16 of 47 observed peaks above 2\.5 m3\/s, though its NSE is 0\.[5-9]/,
          detail: [expect.stringContaining('0 %')],
        },
        { subject: 'validation', message: 'hits 12 of 35' },
      ],
    },
    {
      name: 'by the usual settings, where the purpose needs high flows',
      files: third,
      set: needed,
      finds: [{ field: target, subject: 'calibration' }, { subject: 'validation' }],
    },
  ],
  silent: [
    { name: 'all hit', files: simulated(() => true), set: { ...needed, [peaks]: { above: 2.5 } } },
    { name: 'nobody asks for peaks', files: third },
    {
      name: 'an NSE that does not pass says enough',
      files: { ...observed, 'runs/calibrated/daily.csv': editColumn('flow_m3s', () => 1) },
      set: needed,
    },
    { name: 'too few peaks to judge by', files: third, set: { [peaks]: { above: 2.5, apart: 2000 } } },
  ],
});
