import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsSourceMissing } from './source-missing.ts';

ruleCases(inputsSourceMissing, {
  fires: [
    {
      name: 'no source',
      remove: ['inputs.rainfall.source'],
      phase: 'setup',
      finds: {
        record: 'inputs.rainfall',
        field: 'inputs.rainfall.source',
        level: 'block',
        message: /provider.*title.*collected_by/,
      },
    },
    {
      name: 'no provider',
      remove: ['inputs.rainfall.source.provider'],
      finds: { message: 'who gives the data out' },
    },
    {
      name: 'no title',
      remove: ['inputs.rainfall.source.title'],
      finds: { message: 'what the data set is called' },
    },
    { name: 'no place', remove: ['inputs.rainfall.source.url'], finds: { message: 'where or how' } },
  ],
  silent: [
    {
      name: 'by DOI',
      remove: ['inputs.rainfall.source.url'],
      set: { 'inputs.rainfall.source.doi': '10.1234/rain' },
    },
    {
      name: 'collected by somebody',
      remove: ['inputs.rainfall.source.url'],
      set: { 'inputs.rainfall.source.collected_by': 'volunteers' },
    },
  ],
});
