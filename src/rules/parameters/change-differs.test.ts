import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { parametersChangeDiffers } from './change-differs.ts';

const set = 'parameters.values.0';
const scale = 'parameters.values.1';
const shift = 'parameters.values.2';

ruleCases(parametersChangeDiffers, {
  fires: [
    {
      name: 'scaled',
      set: { [`${scale}.by`]: 1.05 },
      finds: {
        record: 'parameters',
        field: 'parameters.values[1].value',
        subject: 'evaporation_factor',
        stated: 0.9,
        found: 1.05,
        unit: '1',
        level: 'block',
        message: '1 scaled by 1.05',
      },
    },
    {
      name: 'shifted the wrong way',
      set: { [`${shift}.by`]: -0.4 },
      finds: { subject: 'snow_threshold', stated: 0.9, found: 0.1, message: '0.5 shifted by -0.4' },
    },
    {
      name: 'set to another value',
      set: { [`${set}.by`]: 185 },
      finds: { stated: 180, found: 185, message: 'the value it was set to, 185,' },
    },
    {
      name: 'a very small one',
      set: {
        'parameters.values.0': {
          ...{ name: 'leakage', unit: 'm/s', change: 'scale', initial: 2e-9, by: 2, range: [0.1, 10] },
          ...{ value: 5e-9, range_of: 'factor', range_from: 'report 3' },
        },
      },
      finds: { subject: 'leakage', stated: 5e-9, found: 4e-9 },
    },
    {
      // 8 x 1.5 = 12, and 13.0 says 12.95 to 13.05.
      name: 'one layer of a table',
      set: { 'parameters.table': 'calibration/parameters.csv' },
      files: {
        'calibration/parameters.csv':
          'name,layer,change,initial,by,value\nksat,1,scale,20,1.5,30\nksat,2,scale,8,1.5,13.0\n',
      },
      finds: {
        file: 'calibration/parameters.csv',
        line: 3,
        subject: 'ksat (layer 2)',
        stated: 13,
        found: 12,
      },
    },
    {
      name: 'a factor of zero',
      set: { 'parameters.values.1.by': 0 },
      finds: { stated: 0.9, found: 0, message: '1 scaled by 0 is not the final value' },
    },
  ],
  silent: [
    // 0.9 stands for 0.85 to 0.95.
    { name: 'within the decimals of the final value', set: { [`${shift}.by`]: 0.44 } },
    { name: 'no amount', remove: [`${scale}.by`] },
    { name: 'no initial value', remove: [`${shift}.initial`] },
    { name: 'no final value', remove: [`${scale}.value`] },
    {
      name: 'a product that binary can’t hold',
      set: { [`${scale}.initial`]: 0.1, [`${scale}.by`]: 3, [`${scale}.value`]: 0.3 },
    },
  ],
});
