import { rule } from '../rule.ts';

export const manifestUnaccountedFile = rule({
  id: 'manifest.unaccounted-file',
  scope: 'manifest',
  from: 'calibration',
  means: null,
  statement: 'A tracked file under `covers` is named by no record and not left out by `leaves_out`.',
  why: 'A data or control file that no record speaks for may steer the model unnoticed, or be a leftover that a successor takes for the input.',
  source: { basis: 'practice', citation: 'Common practice: every file of a model archive is accounted for.' },
  clear: 'Name the file in the record that uses it, put it under `leaves_out`, or remove it.',
  check: (_, { records }) =>
    records.unaccounted.map((path) => ({
      record: 'manifest',
      field: ['covers'],
      subject: path,
      found: path,
      message: `${path} is covered by this manifest, but no record names it.`,
    })),
});
