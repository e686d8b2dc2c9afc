import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { parametersAtBound } from './at-bound.ts';

const value = (place: number) => `parameters.values.${place}.value`;

ruleCases(parametersAtBound, {
  fires: [
    {
      name: 'at the upper end',
      set: { [value(0)]: 400 },
      finds: {
        record: 'parameters',
        field: 'parameters.values[0]',
        subject: 'soil_capacity',
        stated: '50 to 400',
        found: 400,
        unit: 'mm',
        level: 'warn',
        message: 'the upper end of its range.',
      },
    },
    // 1 % of 350 mm above 50 mm.
    { name: 'within 1 % of the lower end', set: { [value(0)]: 53.5 }, finds: { message: 'the lower end' } },
    // ln 20 + 0.01 ln 10 = ln 20.466: 20.4 lies within on the log scale, 21.8 would on the linear one.
    { name: 'on the log scale', set: { [value(4)]: 20.4 }, finds: { subject: 'groundwater_recession' } },
    {
      name: 'three at once block',
      set: { [value(0)]: 50, [value(2)]: 2, [value(3)]: 10 },
      finds: [
        { subject: 'soil_capacity', level: 'block', message: 'one of 3 that did' },
        { subject: 'snow_threshold', level: 'block' },
        { subject: 'quick_recession', level: 'block' },
      ],
    },
    {
      name: 'three at once in set-up',
      set: { [value(0)]: 50, [value(2)]: 2, [value(3)]: 10 },
      phase: 'setup',
      finds: [{ level: 'note' }, { level: 'note' }, { level: 'note' }],
    },
    {
      name: 'a project that counts a tenth as the end',
      set: {
        [value(0)]: 84,
        departures: [{ threshold: 'parameters.at_bound_share', now: 0.1, because: 'coarse grid' }],
      },
      finds: { subject: 'soil_capacity' },
    },
    {
      name: 'in a table, searched in logarithms',
      set: { 'parameters.table': 'calibration/parameters.csv' },
      files: {
        'calibration/parameters.csv':
          'name,unit,value,range_low,range_high,search\nksat,mm/h,1.03,1,1000,log\n',
      },
      finds: {
        file: 'calibration/parameters.csv',
        line: 2,
        subject: 'ksat',
        message: 'The value of ksat stopped at the lower end',
      },
    },
  ],
  silent: [
    { name: 'just inside', set: { [value(0)]: 53.6 } },
    { name: 'the linear end of a search in logarithms', set: { [value(4)]: 21.7 } },
    { name: 'a fixed value', set: { 'parameters.values.0.range': [180, 180] } },
    { name: 'outside, which is another rule’s', set: { [value(0)]: 401 } },
  ],
});
