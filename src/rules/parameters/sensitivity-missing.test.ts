import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { parametersSensitivityMissing } from './sensitivity-missing.ts';

ruleCases(parametersSensitivityMissing, {
  fires: [
    {
      name: 'nothing is said',
      remove: ['parameters.sensitivity'],
      finds: {
        record: 'parameters',
        field: 'parameters.sensitivity',
        message: 'Nothing says how sensitive',
        level: 'block',
      },
    },
    {
      name: 'a stand-in',
      set: { 'parameters.sensitivity': { none_because: 'tbd' } },
      finds: { level: 'block' },
    },
    {
      name: 'a method without results',
      remove: ['parameters.sensitivity.file'],
      finds: { message: 'names no file with its results', level: 'warn' },
    },
    {
      name: 'a note in calibration',
      phase: 'calibration',
      remove: ['parameters.sensitivity'],
      finds: { level: 'note' },
    },
  ],
  silent: [
    {
      name: 'a reason',
      set: { 'parameters.sensitivity': { none_because: 'two parameters, both well known' } },
    },
    {
      name: 'nothing was calibrated',
      set: { 'parameters.values': [{ name: 'p', unit: 'mm', value: 3, calibrated: false }] },
      remove: ['parameters.sensitivity'],
    },
  ],
});
