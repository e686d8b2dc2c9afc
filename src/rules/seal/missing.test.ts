import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { sealMissing } from './missing.ts';

const young = 'stoplog: 1\nstudy: {phase: calibration}\nmodel: {name: m}\nsetup: {choices: []}\n';

ruleCases(sealMissing, {
  fires: [
    {
      name: 'in the calibration only what it stands on',
      text: young,
      seals: 'none',
      finds: [
        { record: 'study', level: 'block', clear: 'stoplog seal study' },
        { record: 'model', level: 'block' },
        { record: 'setup', level: 'note' },
      ],
    },
    {
      name: 'in the validation everything',
      text: young,
      seals: 'none',
      phase: 'validation',
      finds: [{ level: 'block' }, { level: 'block' }, { record: 'setup', level: 'block' }],
    },
    {
      name: 'in the set-up nothing',
      text: young,
      seals: 'none',
      phase: 'setup',
      finds: [{ level: 'note' }, { level: 'note' }, { level: 'note' }],
    },
    {
      name: 'one record that is new',
      seals: 'sound',
      set: { 'inputs.snow': { role: 'other' } },
      finds: { record: 'inputs.snow', level: 'block' },
    },
  ],
  silent: [
    {
      name: 'a seal that can’t be read, of which seal.unreadable tells',
      byHand: (seals) => seals.replace('Test Reviewer', 'Somebody Else'),
    },
    { name: 'no seal can be read', byHand: (seals) => seals.slice(0, 400) },
    {
      name: 'stale, of which seal.stale tells',
      seals: 'sound',
      set: { 'catchment.name': 'Harrow Brook at Low Bridge' },
    },
  ],
});
