import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsUnitUnknown } from './unit-unknown.ts';

ruleCases(inputsUnitUnknown, {
  fires: [
    {
      name: 'no unit',
      set: { 'inputs.rainfall.series.unit': 'mm per wet day' },
      phase: 'setup',
      finds: {
        record: 'inputs.rainfall',
        field: 'inputs.rainfall.series.unit',
        stated: 'mm per wet day',
        level: 'block',
      },
    },
    {
      name: 'read in two ways',
      set: { 'inputs.streamflow.series.unit': 'Mm3/d' },
      finds: { record: 'inputs.streamflow', message: 'two ways' },
    },
    {
      name: 'rain as a flow',
      set: { 'inputs.rainfall.series.unit': 'm3/s' },
      finds: { message: 'depth of water' },
    },
    {
      name: 'temperature in millimetres',
      set: { 'inputs.temperature.series.unit': 'mm' },
      finds: { record: 'inputs.temperature' },
    },
    {
      name: 'cells in a word',
      set: { 'inputs.terrain.grid.unit': 'cells' },
      finds: { record: 'inputs.terrain', field: 'inputs.terrain.grid.unit' },
    },
    {
      name: 'heights as flow',
      set: { 'inputs.terrain.grid.values_unit': 'm3/s' },
      finds: { field: 'inputs.terrain.grid.values_unit' },
    },
  ],
  silent: ['mm d-1', 'mm/day', 'mm', 'in/d', 'kg m-2 d-1'].map((unit) => ({
    name: unit,
    set: { 'inputs.rainfall.series.unit': unit },
  })),
});
