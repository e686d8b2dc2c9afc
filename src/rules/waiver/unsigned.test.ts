import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { waiverUnsigned } from './unsigned.ts';

ruleCases(waiverUnsigned, {
  fires: [
    {
      name: 'a waiver without anything',
      set: { waivers: [{ rule: 'seal.stale' }] },
      phase: 'setup',
      finds: { record: 'manifest', field: 'waivers[0]', message: /because.*by.*until/, level: 'block' },
    },
    {
      name: 'a waiver signed by a question mark',
      set: { waivers: [{ rule: 'seal.stale', because: 'late', by: '?', until: '2021-06-30' }] },
      finds: { message: 'no person' },
    },
    {
      name: 'an acceptance without its date',
      set: {
        'evaluation.outlet-flow.accepts': [
          { rule: 'seal.stale', because: 'dry years', by: 'Eastmoor Rivers Office' },
        ],
      },
      finds: { field: 'evaluation.outlet-flow.accepts[0]', message: 'no date' },
    },
    {
      name: 'a departure that asks for less, unsigned',
      set: { departures: [{ rule: 'seal.stale', now: 'warns', because: 'moving house' }] },
      finds: { field: 'departures[0]', message: /by.*on/ },
    },
    {
      name: 'a departure with a stand-in for a reason',
      set: { departures: [{ rule: 'seal.reworded', now: 'blocks', because: 'todo' }] },
      finds: { message: 'no reason' },
    },
  ],
  silent: [
    {
      name: 'all signed',
      set: {
        waivers: [
          {
            rule: 'seal.stale',
            because: 'survey reissued',
            by: 'Eastmoor Rivers Office',
            until: '2021-06-30',
          },
        ],
        departures: [
          {
            rule: 'seal.stale',
            now: 'warns',
            because: 'moving house',
            by: 'Eastmoor Rivers Office',
            on: '2021-02-01',
          },
        ],
        'study.accepts': [
          { rule: 'seal.stale', because: 'dry years', by: 'Eastmoor Rivers Office', on: '2021-02-01' },
        ],
      },
    },
    {
      name: 'a stricter departure needs its reason only',
      set: { departures: [{ rule: 'seal.reworded', now: 'blocks', because: 'regulator’s requirement 4.2' }] },
    },
  ],
});
