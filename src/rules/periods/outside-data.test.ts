import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { periodsOutsideData } from './outside-data.ts';

const from2005 = (table: string) => table.replace(/^200[1-4]-.*\n/gm, '');

ruleCases(periodsOutsideData, {
  fires: [
    {
      name: 'the flow record ends before the validation',
      set: { 'inputs.streamflow.period': '2001-10-01/2010-09-29' },
      finds: {
        record: 'periods',
        field: 'periods.validation[0]',
        stated: '2007-10-01/2010-09-30',
        found: '2001-10-01/2010-09-29',
        level: 'block',
        message: 'has one day outside the record of its observations, inputs.streamflow',
      },
    },
    {
      name: 'no period is stated, and the files begin later',
      remove: ['inputs.streamflow.period'],
      files: { 'data/flow.csv': from2005 },
      // 2003-10-01 to 2004-12-31.
      finds: { field: 'periods.calibration[0]', found: '2005-01-01/2010-09-30', message: '458 days' },
    },
    {
      name: 'a target’s own window',
      set: {
        'evaluation.outlet-flow.periods': { calibration: ['2003-10-01/2004-09-30', '2010-01-01/2011-12-31'] },
      },
      finds: {
        record: 'evaluation.outlet-flow',
        field: 'evaluation.outlet-flow.periods.calibration[1]',
        message: '457 days',
      },
    },
    {
      name: 'a window wholly elsewhere',
      set: { 'periods.calibration': ['1990-01-01/1990-12-31'] },
      finds: { message: '365 days' },
    },
    {
      name: 'rain begins after the simulation',
      set: { 'inputs.rainfall.period': '2002-01-01/2010-09-30' },
      finds: {
        record: 'periods',
        field: 'periods.simulation',
        subject: 'runs.calibrated inputs.rainfall',
        message: 'simulates 92 days',
      },
    },
    {
      name: 'a run with a simulation of its own',
      set: { 'runs.dry.simulation': '2041-10-01/2051-09-30' },
      finds: { record: 'runs.dry', field: 'runs.dry.simulation', message: 'input dry-climate' },
    },
  ],
  silent: [
    { name: 'no period is stated, and the files reach', remove: ['inputs.streamflow.period'] },
    {
      name: 'observed flow that a run takes may be shorter than the simulation',
      set: {
        'inputs.streamflow.period': '2003-10-01/2010-09-30',
        'runs.calibrated.takes': ['inputs.rainfall', 'inputs.streamflow', 'inputs.vegetation'],
      },
    },
    {
      name: 'nobody knows what the flow covers',
      remove: ['inputs.streamflow.period', 'inputs.streamflow.files'],
    },
    { name: 'a scenario that does not say what it simulates', remove: ['runs.dry.simulation'] },
  ],
});
