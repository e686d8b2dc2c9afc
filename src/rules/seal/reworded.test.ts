import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { sealReworded } from './reworded.ts';

ruleCases(sealReworded, {
  fires: [
    {
      name: 'a title',
      seals: 'sound',
      set: { 'study.title': 'Dry-weather flow' },
      finds: { record: 'study', level: 'warn', message: 'sealed on 2021-02-01', clear: 'stoplog seal study' },
    },
    {
      name: 'a reason in a list',
      seals: 'sound',
      set: { 'setup.choices.0.because': 'one soil only' },
      finds: { record: 'setup' },
    },
  ],
  silent: [
    { name: 'a figure, of which seal.stale tells', seals: 'sound', set: { 'catchment.area.value': 51 } },
    { name: 'sealed again', set: { 'study.title': 'Dry-weather flow' } },
  ],
});
