import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { studyContactMissing } from './contact-missing.ts';

ruleCases(studyContactMissing, {
  fires: [
    {
      name: 'no contacts',
      remove: ['study.contacts'],
      finds: { record: 'study', field: 'study.contacts', message: 'No contact is named', level: 'note' },
    },
    { name: 'none in an archive', remove: ['study.contacts'], phase: 'archive', finds: { level: 'block' } },
    {
      name: 'a name without a way to reach it',
      remove: ['study.contacts.0.email'],
      finds: { message: 'way to be reached' },
    },
    {
      name: 'an address without a name',
      remove: ['study.contacts.0.name'],
      finds: { message: 'way to be reached' },
    },
  ],
  silent: [
    {
      name: 'reached by ORCID',
      remove: ['study.contacts.0.email'],
      set: { 'study.contacts.0.orcid': '0000-0002-1825-0097' },
    },
    {
      name: 'the second can be reached',
      set: { 'study.contacts': [{ name: 'A' }, { name: 'B', url: 'https://b.example' }] },
    },
  ],
});
