import { withValues } from '../../../tests/harness/edit-lines.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { soundFiles } from '../../../tests/harness/sound-files.ts';
import { inputsUnitDoubtful } from './unit-doubtful.ts';

ruleCases(inputsUnitDoubtful, {
  fires: [
    {
      name: 'inches said to be millimetres',
      files: { 'data/rain.csv': withValues((mm) => mm / 25.4) },
      finds: {
        record: 'inputs.rainfall',
        field: 'inputs.rainfall.series.unit',
        stated: 'mm/d',
        message:
          /^inputs\.check-gauge holds 24\.6\d* times what the series holds over the same time; 25\.4 lies between inches and millimetres/,
        level: 'warn',
      },
    },
    {
      name: 'tenths said to be millimetres',
      files: { 'data/rain.csv': withValues((mm) => mm * 10) },
      finds: { message: '10 lies between tenths of millimetres' },
    },
    {
      name: 'metres without a reference',
      remove: ['inputs.rainfall.compare_with'],
      files: { 'data/rain.csv': withValues((mm) => mm / 1000) },
      finds: { message: /^In its unit the series gives 1\.\d+ mm of rain in a mean year/ },
    },
    {
      name: 'inches in one gauge of a mean',
      set: {
        'inputs.rainfall.files': ['data/rain.csv', 'data/second.csv'],
        'inputs.rainfall.combine': 'mean',
      },
      files: {
        'data/rain.csv': withValues((mm) => mm / 25.4),
        'data/second.csv': soundFiles()['data/rain.csv'] ?? '',
      },
      finds: {
        subject: 'data/rain.csv',
        message: /^inputs\.check-gauge holds 24\.6\d* times what data\/rain\.csv holds/,
      },
    },
    {
      name: 'litres said to be cubic metres',
      files: { 'data/flow.csv': withValues((flow) => (Number.isNaN(flow) ? 'NA' : flow * 1000)) },
      finds: {
        record: 'inputs.streamflow',
        stated: 'm3/s',
        message: /^Over the catchment the flow makes .* beside .*; it would make \d+(?:\.\d+)? mm in L\/s/,
      },
    },
    {
      name: 'a river of another size than its unit says',
      set: { 'inputs.streamflow.series.unit': 'L/s' },
      finds: { record: 'inputs.streamflow', stated: 'L/s' },
    },
    {
      name: 'kelvin',
      files: { 'data/temperature.csv': withValues((degC) => degC + 273.15) },
      finds: { record: 'inputs.temperature', message: 'so hot. Kelvin' },
    },
    {
      name: 'degrees Fahrenheit',
      files: { 'data/temperature.csv': withValues((degC) => degC * 1.8 + 32) },
      finds: { record: 'inputs.temperature', stated: 'degC' },
    },
    {
      name: 'degrees Celsius that are said to be kelvin',
      set: { 'inputs.temperature.series.unit': 'K' },
      finds: { record: 'inputs.temperature', message: 'so cold. Kelvin' },
    },
    {
      name: 'inches read twice in one gauge that has a quarter more rain',
      set: {
        'inputs.rainfall.files': ['data/rain.csv', 'data/second.csv', 'data/third.csv'],
        'inputs.rainfall.combine': 'mean',
      },
      files: {
        'data/rain.csv': withValues((mm) => mm * 1.25 * 25.4),
        'data/second.csv': soundFiles()['data/rain.csv'] ?? '',
        'data/third.csv': soundFiles()['data/rain.csv'] ?? '',
      },
      finds: { message: 'between inches and millimetres' },
    },
  ],
  silent: [
    { name: 'a wet gauge', files: { 'data/rain.csv': withValues((mm) => mm * 3) } },
    {
      name: 'a code for a missing value, which another rule names',
      files: { 'data/temperature.csv': withValues(() => -99.9, 30, 30) },
    },
    {
      name: 'kelvin that says so',
      set: { 'inputs.temperature.series.unit': 'K' },
      files: { 'data/temperature.csv': withValues((degC) => degC + 273.15) },
    },
    {
      name: 'inches that say so',
      set: { 'inputs.rainfall.series.unit': 'in/d' },
      files: { 'data/rain.csv': withValues((mm) => mm / 25.4) },
    },
    {
      name: 'no area to spread the flow over',
      remove: ['catchment.area'],
      files: { 'data/flow.csv': withValues((flow) => flow * 1000) },
    },
  ],
});
