import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { studyLiteratureMissing } from './literature-missing.ts';

ruleCases(studyLiteratureMissing, {
  fires: [
    {
      name: 'nothing said',
      remove: ['study.literature'],
      finds: { record: 'study', field: 'study.literature', level: 'block' },
    },
    { name: 'an empty list', set: { 'study.literature': [] }, finds: { message: 'No earlier work' } },
    {
      name: 'none found, sought nowhere',
      set: { 'study.literature': { none_found: { sought_in: [], on: '2020-01-12' } } },
      finds: { message: 'where and when' },
    },
    {
      name: 'none found, on no day',
      set: { 'study.literature': { none_found: { sought_in: ['county library'] } } },
      finds: { message: 'where and when' },
    },
    {
      name: 'a note before the validation',
      remove: ['study.literature'],
      phase: 'calibration',
      finds: { level: 'note' },
    },
  ],
  silent: [
    {
      name: 'sought in vain',
      set: { 'study.literature': { none_found: { sought_in: ['county library'], on: '2020-01-12' } } },
    },
  ],
});
