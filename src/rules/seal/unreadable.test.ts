import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { sealUnreadable } from './unreadable.ts';

ruleCases(sealUnreadable, {
  fires: [
    {
      name: 'cut short',
      byHand: (seals) => seals.slice(0, 400),
      phase: 'setup',
      finds: { record: 'manifest', file: 'stoplog.seals.json', subject: 'not-json', level: 'block' },
    },
    {
      name: 'a merge conflict',
      byHand: (seals) => `<<<<<<< HEAD\n${seals}=======\n${seals}>>>>>>> other\n`,
      finds: { subject: 'conflict', line: 1, clear: 'After a merge: `stoplog seal`' },
    },
    {
      name: 'another reviewer written in',
      byHand: (seals) => seals.replace('Test Reviewer', 'Somebody Else'),
      finds: { record: 'balance.catchment', subject: 'edited' },
    },
    {
      name: 'an entry of a record that is gone',
      byHand: (seals) => seals.replace('"records": {', '"records": { "inputs.gone": 1,'),
      finds: { subject: 'shape', clear: 'stoplog seal --all drops it' },
    },
    {
      name: 'written by a newer Stoplog',
      sealed: { study: { scheme: 999 } },
      finds: { record: 'study', subject: 'newer-scheme', clear: 'Install' },
    },
  ],
  silent: [{ name: 'no seals at all', seals: 'none' }],
});
