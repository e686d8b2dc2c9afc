import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { parametersOutOfRange } from './out-of-range.ts';

const first = 'parameters.values.0';
const factor = 'parameters.values.1';

ruleCases(parametersOutOfRange, {
  fires: [
    {
      name: 'above',
      set: { [`${first}.value`]: 400.1 },
      finds: {
        record: 'parameters',
        field: 'parameters.values[0]',
        subject: 'soil_capacity',
        stated: '50 to 400',
        found: 400.1,
        unit: 'mm',
        level: 'block',
        message: 'The value of soil_capacity',
      },
    },
    { name: 'below', set: { [`${first}.value`]: 49 }, finds: { found: 49 } },
    {
      name: 'a factor, where the range bounds the factor',
      set: { [`${factor}.by`]: 1.4, [`${factor}.initial`]: 0.5, [`${factor}.value`]: 0.7 },
      finds: { subject: 'evaporation_factor', found: 1.4, unit: '1', message: 'The factor of' },
    },
    {
      name: 'a shift',
      set: { 'parameters.values.2.range_of': 'factor', 'parameters.values.2.range': [-0.3, 0.3] },
      finds: { subject: 'snow_threshold', found: 0.4, unit: 'degC', message: 'The shift of' },
    },
    {
      name: 'a range that ends before it begins',
      set: { [`${first}.range`]: [400, 50] },
      finds: { message: 'ends at 50, below its beginning at 400' },
    },
    {
      name: 'in a table with decimal commas',
      set: {
        'parameters.table': { file: 'calibration/parameters.csv', separator: 'semicolon', decimal: 'comma' },
      },
      files: { 'calibration/parameters.csv': 'name;unit;value;range_low;range_high\nn;1;0,9;0,01;0,2\n' },
      finds: { file: 'calibration/parameters.csv', line: 2, subject: 'n', stated: '0.01 to 0.2', found: 0.9 },
    },
  ],
  silent: [
    { name: 'on an end', set: { [`${first}.value`]: 400 } },
    { name: 'a fixed value', set: { [`${first}.range`]: [180, 180] } },
    { name: 'not calibrated', set: { [`${first}.value`]: 500, [`${first}.calibrated`]: false } },
    { name: 'no range', remove: [`${first}.range`] },
    {
      name: 'a value outside, where the range bounds the factor',
      set: { [`${factor}.initial`]: 2, [`${factor}.value`]: 1.8 },
    },
  ],
});
