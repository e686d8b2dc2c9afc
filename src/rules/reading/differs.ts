import { rule } from '../rule.ts';

export const readingDiffers = rule({
  id: 'reading.differs',
  scope: 'manifest',
  from: 'setup',
  means: 'contradicted',
  statement: 'The model’s control, log or output file says otherwise than the record.',
  why: 'The model does what its control file says. A record that says something else describes a run that never happened.',
  source: { basis: 'definition', citation: 'A record states what the model’s own files hold.' },
  clear: 'Correct the record, or correct the file and run the model again.',
  check: (_, { readings }) =>
    readings
      .filter(({ problem, agrees }) => problem === null && !agrees)
      .map(({ record, of, name, file, line, stated, found }) => ({
        record,
        field: of,
        subject: `${name} ${file}`,
        ...(stated === null ? {} : { stated }),
        ...(found === null ? {} : { found }),
        message: `${file}${line === null ? '' : ` line ${line}`} says ${found}; ${
          stated === null ? `the record says nothing on \`${name}\`` : `\`${name}\` says ${stated}`
        }.`,
      })),
});
