import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { waiverExpired } from './expired.ts';

ruleCases(waiverExpired, {
  fires: [
    {
      name: 'yesterday',
      set: { waivers: [{ rule: 'seal.stale', record: 'study', until: '2021-02-28' }] },
      phase: 'setup',
      finds: {
        record: 'manifest',
        field: 'waivers[0].until',
        stated: '2021-02-28',
        message: 'ended on 2021-02-28; today is 2021-03-01',
        level: 'block',
      },
    },
  ],
  silent: [
    { name: 'today is its last day', set: { waivers: [{ rule: 'seal.stale', until: '2021-03-01' }] } },
    { name: 'no day, of which waiver.unsigned tells', set: { waivers: [{ rule: 'seal.stale' }] } },
  ],
});
