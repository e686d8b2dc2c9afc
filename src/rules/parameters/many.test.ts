import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { parametersMany } from './many.ts';

const parameters = (count: number, more: object = {}) =>
  Array.from({ length: count }, (_, index) => ({
    name: `p${index + 1}`,
    unit: 'mm',
    change: 'set',
    initial: 1,
    value: 2,
    range: [0, 9],
    range_from: 'report 3',
    ...more,
  }));

ruleCases(parametersMany, {
  fires: [
    {
      name: 'seven, and nothing that tells them apart',
      set: { 'parameters.values': parameters(7) },
      remove: ['parameters.sensitivity'],
      finds: { record: 'parameters', found: 7, message: '7 parameters were calibrated', level: 'warn' },
    },
    {
      name: 'a reason in place of a sensitivity analysis',
      set: { 'parameters.values': parameters(7), 'parameters.sensitivity': { none_because: 'no time' } },
      finds: { found: 7 },
    },
    {
      name: 'four, where the project asks for three',
      set: {
        'parameters.values': parameters(4),
        departures: [{ threshold: 'parameters.calibrated', now: 3, because: 'short record' }],
      },
      remove: ['parameters.sensitivity'],
      finds: { found: 4 },
    },
  ],
  silent: [
    { name: 'seven with a sensitivity analysis', set: { 'parameters.values': parameters(7) } },
    { name: 'six without', set: { 'parameters.values': parameters(6) }, remove: ['parameters.sensitivity'] },
    {
      name: 'seven of which one was fixed',
      set: {
        'parameters.values': [...parameters(6), { name: 'fixed', unit: 'mm', value: 3, calibrated: false }],
      },
      remove: ['parameters.sensitivity'],
    },
    {
      name: 'one factor for nine zones',
      set: {
        'parameters.values': Array.from({ length: 9 }, (_, zone) => ({
          name: 'capacity',
          unit: 'mm',
          change: 'scale',
          by: 1.1,
          initial: 10,
          value: 11,
          range: [0.5, 2],
          range_of: 'factor',
          range_from: 'report 3',
          scope: `zone ${zone}`,
        })),
      },
      remove: ['parameters.sensitivity'],
    },
  ],
});
