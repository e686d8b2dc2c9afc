import { rule } from '../rule.ts';

export const readingNotFound = rule({
  id: 'reading.not-found',
  scope: 'manifest',
  from: 'setup',
  means: 'contradicted',
  statement: 'A reading’s file, key, row, line, pattern or pointer is not there, or matches more than once.',
  why: 'A record that is to be held against the model’s own file is held against nothing, and the two can part unseen.',
  source: { basis: 'definition', citation: 'A reading takes one value from one place.' },
  clear: 'Correct `file` or `take` of the reading so that it finds the one value.',
  check: (_, { readings }) =>
    readings.flatMap(({ record, name, field, file, problem }) =>
      problem === null
        ? []
        : {
            record,
            field,
            subject: `${name} ${file}`,
            message: `The reading for \`${name}\` could not be taken: ${problem}.`,
          },
    ),
});
