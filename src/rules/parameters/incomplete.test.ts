import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { parametersIncomplete } from './incomplete.ts';

const first = 'parameters.values.0';

ruleCases(parametersIncomplete, {
  fires: [
    ...['unit', 'value', 'change', 'range', 'range_from'].map((key) => ({
      name: `no ${key}`,
      remove: [`${first}.${key}`],
      finds: {
        record: 'parameters',
        field: 'parameters.values[0]',
        subject: 'soil_capacity',
        level: 'block' as const,
        message: /^Parameter soil_capacity lacks [^,]+\.$/,
      },
    })),
    {
      name: 'a factor without initial value and amount',
      remove: ['parameters.values.1.initial', 'parameters.values.1.by'],
      finds: { subject: 'evaporation_factor', message: 'initial value, amount of the change' },
    },
    {
      name: 'not calibrated, and no value',
      set: { [`${first}.calibrated`]: false },
      remove: [`${first}.value`],
      finds: { message: 'lacks value.' },
    },
  ],
  silent: [
    {
      name: 'one that was not calibrated needs unit and value only',
      set: { 'parameters.values.0': { name: 'depth', unit: 'mm', value: 900, calibrated: false } },
    },
    { name: 'a value that was set needs no initial one', remove: [`${first}.initial`] },
    { name: 'no values, which is another rule’s', remove: ['parameters.values'] },
  ],
});
