import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { uncertaintyBandMissing } from './band-missing.ts';

const bands = 'uncertainty.bands';

ruleCases(uncertaintyBandMissing, {
  fires: [
    {
      name: 'none',
      remove: [bands],
      finds: { record: 'uncertainty', field: bands, subject: 'outlet-flow', level: 'block' },
    },
    { name: 'no file', remove: [`${bands}.outlet-flow.file`], finds: { subject: 'outlet-flow' } },
    {
      name: 'the variable that the purpose needs has none',
      set: {
        'study.needs': [{ variable: 'soil_water' }],
        'evaluation.moisture': { variable: 'soil_water' },
      },
      finds: { subject: 'moisture' },
    },
    { name: 'only noted at validation', remove: [bands], phase: 'validation', finds: { level: 'note' } },
  ],
  silent: [
    { name: 'a second target without one', set: { 'evaluation.moisture': { variable: 'soil_water' } } },
    {
      name: 'a variable that nobody can evaluate is no main target',
      set: {
        'study.needs': [{ variable: 'soil_water' }, { variable: 'streamflow' }],
        'evaluation.moisture': { variable: 'soil_water', none_because: 'no probes' },
      },
    },
    { name: 'nothing is evaluated', remove: [bands, 'evaluation'] },
  ],
});
