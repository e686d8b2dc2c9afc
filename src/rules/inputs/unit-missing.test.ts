import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsUnitMissing } from './unit-missing.ts';

ruleCases(inputsUnitMissing, {
  fires: [
    {
      name: 'a series',
      remove: ['inputs.rainfall.series.unit'],
      phase: 'setup',
      finds: { record: 'inputs.rainfall', field: 'inputs.rainfall.series.unit', level: 'block' },
    },
    {
      name: 'an empty unit',
      set: { 'inputs.rainfall.series.unit': ' ' },
      finds: { record: 'inputs.rainfall' },
    },
    {
      name: 'a raster',
      remove: ['inputs.terrain.grid.unit'],
      finds: { record: 'inputs.terrain', field: 'inputs.terrain.grid.unit', message: 'cell size' },
    },
  ],
  silent: [{ name: 'neither series nor raster', remove: ['inputs.rainfall.series', 'inputs.terrain.grid'] }],
});
