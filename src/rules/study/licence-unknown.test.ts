import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { studyLicenceUnknown } from './licence-unknown.ts';

ruleCases(studyLicenceUnknown, {
  fires: [
    {
      name: 'none',
      remove: ['study.licence'],
      phase: 'archive',
      finds: { record: 'study', field: 'study.licence', message: 'no licence', level: 'block' },
    },
    {
      name: 'misspelt',
      set: { 'study.licence': 'CC-BY 4.0' },
      finds: { stated: 'CC-BY 4.0', message: 'the nearest is CC-BY-4.0', level: 'note' },
    },
    {
      name: 'in words',
      set: { 'study.licence': 'free for research' },
      finds: { stated: 'free for research' },
    },
    {
      name: 'one of two unknown',
      set: { 'study.licence': 'MIT OR Our-Own' },
      finds: { message: '`Our-Own` is no SPDX' },
    },
    { name: 'in small letters', set: { 'study.licence': 'mit' }, finds: { message: 'the nearest is MIT' } },
  ],
  silent: ['MIT', 'MIT OR Apache-2.0', 'CC-BY-3.0-AU', 'GPL-3.0', 'GPL-3.0-or-later'].map((licence) => ({
    name: licence,
    set: { 'study.licence': licence },
  })),
});
