import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { waiverUnused } from './unused.ts';

ruleCases(waiverUnused, {
  fires: [
    {
      name: 'nothing is found',
      set: { waivers: [{ rule: 'seal.stale', record: 'study', until: '2021-06-30' }] },
      finds: {
        record: 'manifest',
        field: 'waivers[0]',
        message: 'waiver of seal.stale for study matches nothing',
        level: 'warn',
      },
    },
    {
      name: 'found on another record',
      remove: ['inputs.rainfall.source'],
      set: { waivers: [{ rule: 'inputs.source-missing', record: 'inputs.terrain' }] },
      finds: { field: 'waivers[0]' },
    },
    {
      name: 'another subject',
      remove: ['study.purpose'],
      set: { waivers: [{ rule: 'study.purpose-missing', subject: 'decision' }] },
      finds: { field: 'waivers[0]' },
    },
  ],
  silent: [
    {
      name: 'found',
      remove: ['inputs.rainfall.source'],
      set: { waivers: [{ rule: 'inputs.source-missing', record: 'inputs.rainfall' }] },
    },
    {
      name: 'found on any record',
      remove: ['inputs.rainfall.source'],
      set: { waivers: [{ rule: 'inputs.source-missing' }] },
    },
    {
      name: 'the subject is found',
      remove: ['study.purpose'],
      set: { waivers: [{ rule: 'study.purpose-missing', subject: 'purpose' }] },
    },
    {
      name: 'expired, of which waiver.expired tells',
      set: { waivers: [{ rule: 'seal.stale', until: '2020-01-01' }] },
    },
    {
      name: 'of no rule, of which manifest.unknown-record tells',
      set: { waivers: [{ rule: 'seal.stael' }] },
    },
  ],
});
