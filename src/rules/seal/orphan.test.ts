import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { sealOrphan } from './orphan.ts';

ruleCases(sealOrphan, {
  fires: [
    {
      name: 'a record that is gone',
      seals: 'sound',
      remove: ['catchment'],
      finds: {
        record: 'manifest',
        file: 'stoplog.seals.json',
        subject: 'catchment',
        message: 'sealed on 2021-02-01 by Test Reviewer',
        level: 'warn',
      },
    },
    {
      name: 'a record that was renamed',
      seals: 'sound',
      remove: ['inputs.vegetation', 'seasons'],
      set: { 'inputs.leaves': { role: 'vegetation', files: ['data/leaf-area.csv'] } },
      finds: { subject: 'inputs.vegetation', clear: '--moved' },
    },
  ],
  silent: [{ name: 'nothing is sealed', seals: 'none' }],
});
