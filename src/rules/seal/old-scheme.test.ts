import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { sealOldScheme } from './old-scheme.ts';

ruleCases(sealOldScheme, {
  fires: [
    {
      name: 'every record after an upgrade',
      text: 'stoplog: 1\nstudy: {title: Flow}\nmodel: {name: m}\n',
      upgraded: true,
      finds: [
        { record: 'study', level: 'warn', message: 'scheme 1', clear: 'stoplog seal study' },
        { record: 'model', level: 'warn' },
      ],
    },
  ],
  silent: [
    {
      name: 'stale by its own scheme, of which seal.stale tells',
      text: 'stoplog: 1\nstudy: {purpose: Floods}\n',
      seals: 'sound',
      upgraded: true,
    },
  ],
});
