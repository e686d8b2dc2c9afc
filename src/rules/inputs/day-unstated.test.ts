import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsDayUnstated } from './day-unstated.ts';

ruleCases(inputsDayUnstated, {
  fires: [
    {
      name: 'no hour',
      remove: ['inputs.rainfall.series.day_ends'],
      finds: {
        record: 'inputs.rainfall',
        field: 'inputs.rainfall.series',
        message: 'Daily rain',
        level: 'warn',
      },
    },
    {
      name: 'no offset',
      remove: ['inputs.streamflow.series.utc_offset'],
      finds: { record: 'inputs.streamflow', message: /Daily flow.*UTC/ },
    },
    {
      name: 'neither',
      remove: ['inputs.rainfall.series.day_ends', 'inputs.rainfall.series.utc_offset'],
      finds: { message: /hour the day ends.*offset/ },
    },
  ],
  silent: [
    { name: 'temperature', remove: ['inputs.temperature.series.day_ends'] },
    {
      name: 'monthly rain',
      remove: ['inputs.rainfall.series.day_ends'],
      set: { 'inputs.rainfall.series.step': 'P1M' },
    },
  ],
});
