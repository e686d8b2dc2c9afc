import { rule } from '../rule.ts';

export const sealOldScheme = rule({
  id: 'seal.old-scheme',
  scope: 'manifest',
  from: 'warn',
  means: null,
  statement: 'A record was sealed by an older version of Stoplog, by whose rules the seal still holds.',
  why: 'A newer version may follow more of what a record rests on. The old seal is good for what it covers; a new one covers all.',
  source: { basis: 'house', citation: 'Our own choice: an upgrade makes nothing stale overnight.' },
  clear: 'When convenient, look at the record and: stoplog seal RECORD',
  check: (_, { standings }) =>
    [...standings.values()].flatMap(({ record, oldScheme, seal }) =>
      oldScheme
        ? {
            record,
            message: `This record was sealed on ${seal?.sealed_on} by an older version of Stoplog (scheme ${seal?.scheme}). The seal still holds by that scheme.`,
            clear: `When convenient, look at the record, then: stoplog seal ${record}`,
          }
        : [],
    ),
});
