import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { periodsCalibrationMissing } from './calibration-missing.ts';

const own = 'evaluation.outlet-flow.periods';

ruleCases(periodsCalibrationMissing, {
  fires: [
    {
      name: 'none is stated',
      remove: ['periods.calibration'],
      finds: {
        record: 'periods',
        field: 'periods.calibration',
        level: 'block',
        message: 'No calibration window',
      },
    },
    { name: 'an empty list', set: { 'periods.calibration': [] }, finds: { record: 'periods' } },
    { name: 'no periods at all', remove: ['periods'], finds: { record: 'periods' } },
    {
      name: 'only noted in set-up',
      remove: ['periods.calibration'],
      phase: 'setup',
      finds: { level: 'note' },
    },
    {
      name: 'one of two targets has its own',
      remove: ['periods.calibration'],
      set: { [own]: { calibration: ['2003-10-01/2007-09-30'] }, 'evaluation.other': { variable: 'other' } },
      finds: { record: 'periods' },
    },
  ],
  silent: [
    {
      name: 'each target has its own',
      remove: ['periods.calibration'],
      set: { [own]: { calibration: ['2003-10-01/2007-09-30'] } },
    },
  ],
});
