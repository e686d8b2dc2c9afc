import { rule } from '../rule.ts';

export const sealReworded = rule({
  id: 'seal.reworded',
  scope: 'manifest',
  from: 'warn',
  means: null,
  statement: 'Only reasons and notes of a record changed since it was sealed.',
  why: 'No figure, file or choice moved, so nothing that rests on the record is in doubt; but the reviewer read other words.',
  source: { basis: 'house', citation: 'Our own choice: prose makes nothing else stale.' },
  clear: 'Read the new words, then: stoplog seal RECORD',
  check: (_, { standings }) =>
    [...standings.values()].flatMap(({ record, reworded, seal }) =>
      reworded
        ? {
            record,
            message: `The wording of this record changed since it was sealed on ${seal?.sealed_on}; figures, files and choices did not.`,
            clear: `Read the new words, then: stoplog seal ${record}`,
          }
        : [],
    ),
});
