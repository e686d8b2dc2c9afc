import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsRetrievedMissing } from './retrieved-missing.ts';

ruleCases(inputsRetrievedMissing, {
  fires: [
    {
      name: 'no date',
      remove: ['inputs.rainfall.source.retrieved'],
      finds: { record: 'inputs.rainfall', field: 'inputs.rainfall.source.retrieved', level: 'block' },
    },
    { name: 'no source', remove: ['inputs.rainfall.source'], phase: 'calibration', finds: { level: 'note' } },
    {
      name: 'tomorrow',
      set: { 'inputs.rainfall.source.retrieved': '2021-03-02' },
      finds: { stated: '2021-03-02', message: 'after today, 2021-03-01' },
    },
  ],
  silent: [{ name: 'today', set: { 'inputs.rainfall.source.retrieved': '2021-03-01' } }],
});
