import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { readingNotFound } from './not-found.ts';

ruleCases(readingNotFound, {
  fires: [
    {
      name: 'no such key',
      files: { 'model/control.txt': 'begins 2001-10-01\n' },
      phase: 'setup',
      finds: {
        record: 'periods',
        field: 'readings[0]',
        message: 'no lines that begin with the key `warmup_years`',
        level: 'block',
      },
    },
    {
      name: 'two such keys',
      files: { 'model/control.txt': (old) => `${old}warmup_years 2\n` },
      finds: { message: 'several lines that begin with the key `warmup_years`: 3, 4' },
    },
    {
      name: 'no such file',
      files: { 'runs/calibrated/run.log': null },
      finds: {
        record: 'model',
        field: 'readings[2]',
        message: 'content of runs/calibrated/run.log is not here',
      },
    },
    {
      name: 'text where a number should be',
      files: { 'model/control.txt': (old) => old.replace('warmup_years 2', 'warmup_years two') },
      finds: { message: 'model/control.txt line 3 says `two`, where a number is expected' },
    },
    {
      name: 'of several values',
      set: { 'readings.0.of': 'parameters.calibrated_by' },
      remove: ['readings.0.as'],
      finds: { message: 'no single value' },
    },
    {
      name: 'another quantity',
      set: { 'readings.3.unit': 'd' },
      finds: { message: 'measure different things' },
    },
  ],
  silent: [
    {
      name: 'found and different',
      files: { 'model/control.txt': (old) => old.replace('warmup_years 2', 'warmup_years 3') },
    },
  ],
});
