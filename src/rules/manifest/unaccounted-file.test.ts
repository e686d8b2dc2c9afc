import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { manifestUnaccountedFile } from './unaccounted-file.ts';

ruleCases(manifestUnaccountedFile, {
  fires: [
    {
      name: 'a data file that no record names',
      files: { 'data/old-rain.csv': 'date,rain_mm\n' },
      phase: 'calibration',
      finds: { record: 'manifest', field: 'covers', subject: 'data/old-rain.csv', level: 'block' },
    },
    {
      name: 'after its record is gone',
      remove: ['inputs.vegetation', 'seasons'],
      phase: 'setup',
      finds: { subject: 'data/leaf-area.csv', level: 'note' },
    },
  ],
  silent: [
    { name: 'left out', files: { 'data/README.md': 'about' } },
    { name: 'not covered', files: { 'notes/old.txt': 'notes' } },
  ],
});
