import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { readingDiffers } from './differs.ts';

ruleCases(readingDiffers, {
  fires: [
    {
      name: 'years of warm-up',
      files: { 'model/control.txt': (old) => old.replace('warmup_years 2', 'warmup_years 3') },
      phase: 'setup',
      finds: {
        record: 'periods',
        field: 'periods.warm_up',
        stated: 2,
        found: 3,
        message: 'model/control.txt line 3 says 3; `periods.warm_up` says 2',
        level: 'block',
      },
    },
    {
      name: 'a release',
      files: { 'runs/calibrated/run.log': 'release 2.0.9\n' },
      finds: { record: 'model', field: 'model.release', stated: '2.1.0', found: '2.0.9' },
    },
    {
      name: 'a parameter',
      set: { 'parameters.values.0.value': 181 },
      finds: {
        record: 'parameters',
        field: 'parameters.values[0].value',
        stated: 181,
        found: 180,
        message: 'line 2 says 180; `parameters.soil_capacity` says 181',
      },
    },
    {
      name: 'a first day',
      set: { 'periods.simulation': '2001-10-02/2010-09-30' },
      finds: { stated: '2001-10-02', found: '2001-10-01' },
    },
    {
      name: 'the record is silent',
      remove: ['model.release'],
      finds: { message: 'the record says nothing on `model.release`', found: '2.1.0' },
    },
  ],
  silent: [
    {
      name: 'the same number, written otherwise',
      files: { 'model/parameters.txt': (old) => old.replace('soil_capacity 180', 'soil_capacity 1.80D+02') },
    },
    {
      name: 'another unit',
      set: { 'readings.3.unit': 'cm' },
      files: { 'model/parameters.txt': (old) => old.replace('soil_capacity 180', 'soil_capacity 18') },
    },
    {
      name: 'not found, of which reading.not-found tells',
      files: { 'model/control.txt': 'begins 2001-10-01\n' },
    },
  ],
});
