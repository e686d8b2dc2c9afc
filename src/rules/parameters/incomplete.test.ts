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
    {
      name: 'a row of a table without unit and range',
      set: { 'parameters.table': 'calibration/parameters.csv' },
      files: { 'calibration/parameters.csv': 'name,change,value,unit\nksat,set,12,\n' },
      finds: {
        file: 'calibration/parameters.csv',
        line: 2,
        field: 'parameters.table',
        subject: 'ksat',
        message: 'Parameter ksat lacks unit, range, source of its range (`range_from`).',
      },
    },
    {
      name: 'a table of no parameters',
      set: { 'parameters.table': 'calibration/parameters.csv' },
      remove: ['parameters.values'],
      files: { 'calibration/parameters.csv': 'name,value\n' },
      finds: { message: 'expected a row for each parameter, received "none"' },
    },
    ...[
      ['name,value\nksat,twelve\n', 'expected a number in `value`, received "twelve"'],
      ['name,change\nksat,double\n', 'expected set, shift, scale in `change`, received "double"'],
      ['name,value\n,12\n', 'expected a parameter’s name, received ""'],
      ['parameter,value\nksat,12\n', 'received "no column `name`"'],
    ].map(([table = '', message = '']) => ({
      name: `a row that can’t be read: ${table.split('\n')[1]}`,
      set: { 'parameters.table': 'calibration/parameters.csv' },
      files: { 'calibration/parameters.csv': table },
      finds: { file: 'calibration/parameters.csv', line: 2, message },
    })),
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
