import { editColumn } from '../../../tests/harness/columns.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { evaluationUnseen } from './unseen.ts';

const target = 'evaluation.outlet-flow';
const review = `${target}.review`;
const changed = { 'runs/calibrated/daily.csv': editColumn('flow_m3s', (_, flow) => flow * 1.01) };

// What happens from one seal to the next is played in tests/situations/model-rerun.test.ts.
ruleCases(evaluationUnseen, {
  fires: [
    {
      name: 'no review',
      remove: [review],
      finds: { record: target, field: review, level: 'block', message: 'Nobody says, with name and date' },
    },
    { name: 'no name', remove: [`${review}.by`], finds: { field: review } },
    { name: 'no date', remove: [`${review}.on`], finds: { field: review } },
    { name: 'nothing that was seen', set: { [`${review}.says`]: 'n/a' }, finds: { field: review } },
    {
      name: 'the simulated series changed, and the review did not',
      seals: 'sound',
      files: changed,
      finds: { stated: '2021-01-15', message: 'changed after the review of 2021-01-15' },
    },
    {
      name: 'the observed series changed',
      seals: 'sound',
      files: {
        'data/flow.csv': editColumn('flow_m3s', (date, flow) =>
          date === '2005-03-01' ? 9 : Number.isNaN(flow) ? 'NA' : flow,
        ),
      },
      finds: { message: 'changed after the review' },
    },
    {
      name: 'only noted while calibrating',
      remove: [review],
      phase: 'calibration',
      finds: { level: 'note' },
    },
  ],
  silent: [
    {
      name: 'somebody looked again',
      seals: 'sound',
      files: changed,
      set: { [`${review}.on`]: '2021-02-20' },
    },
    {
      name: 'another column of the file changed',
      seals: 'sound',
      files: { 'runs/calibrated/daily.csv': editColumn('soil_mm', (_, soil) => soil + 1) },
    },
    { name: 'never sealed', seals: 'none' },
    {
      name: 'a variable that can’t be evaluated',
      set: { 'evaluation.soil': { variable: 'soil_water', none_because: 'no probes' } },
    },
  ],
});
