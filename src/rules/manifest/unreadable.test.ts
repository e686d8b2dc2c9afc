import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { manifestUnreadable } from './unreadable.ts';

ruleCases(manifestUnreadable, {
  fires: [
    {
      name: 'broken YAML',
      text: 'stoplog: 1\nstudy: {id: harrow\n',
      finds: { record: 'manifest', file: 'stoplog.yaml', level: 'block' },
    },
    {
      name: 'a key that stands twice',
      text: 'stoplog: 1\nstudy: {}\nstudy: {}\n',
      finds: { line: 3, column: 1 },
    },
    {
      name: 'an unknown key, with the nearest',
      text: 'stoplog: 1\nstudy:\n  purpos: flow\n',
      finds: { line: 3, column: 3, subject: 'study.purpos', clear: '`purpose`' },
    },
    {
      name: 'every fault at once',
      set: { 'periods.warm_up': 'long', 'study.phase': 'later', 'model.version': 2.1 },
      finds: [{ subject: 'study.phase' }, { subject: 'model.version' }, { subject: 'periods.warm_up' }],
    },
    { name: 'an empty file', text: '', finds: { line: 1, message: 'stoplog' } },
  ],
  silent: [{ name: 'the least that there can be', text: 'stoplog: 1\n' }],
});
