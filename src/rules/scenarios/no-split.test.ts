import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { scaled } from '../../../tests/harness/scaled.ts';
import { scenariosNoSplit } from './no-split.ts';

// Terciles (type 7) of 981, 987, 1071 and 1161 mm are 987 and 1071 mm; the scenario's mean is 1019 mm.
const drier = { 'data/dry-rain.csv': scaled('rain_mm', 0.965) };

ruleCases(scenariosNoSplit, {
  fires: [
    {
      name: 'a scenario as dry as the dry years',
      files: drier,
      finds: {
        record: 'scenarios.dry',
        level: 'warn',
        subject: 'annual_rainfall',
        message: 'that of a dry year of calibration (below 987)',
      },
    },
    {
      name: 'a scenario as wet as the wet years',
      files: { 'data/dry-rain.csv': scaled('rain_mm', 1.1) },
      finds: { message: 'that of a wet year of calibration (above 1 071)' },
    },
  ],
  silent: [
    {
      name: 'other land under the rain of the study itself',
      set: {
        'scenarios.cases.dry.drivers.annual_rainfall': { input: 'rainfall', over: '2006-10-01/2008-09-30' },
      },
    },
    {
      name: 'a differential split-sample test is recorded',
      files: drier,
      set: { 'evaluation.outlet-flow.split_test': 'differential' },
    },
  ],
});
