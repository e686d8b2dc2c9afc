import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { parametersFileDiffers } from './file-differs.ts';

const file = 'model/parameters.txt';
const named = { 'parameters.model_file': { file, separator: 'blank' } };
const changed = (from: string, to: string) => ({ [file]: (old: string) => old.replace(from, to) });

ruleCases(parametersFileDiffers, {
  fires: [
    {
      name: 'another value',
      set: named,
      files: changed('soil_capacity 180', 'soil_capacity 182'),
      finds: {
        record: 'parameters',
        field: 'parameters.values[0].value',
        subject: 'soil_capacity',
        stated: 180,
        found: '182',
        unit: 'mm',
        message: `soil_capacity is 180 in the record, and 182 in ${file} line 2.`,
        level: 'block',
      },
    },
    {
      name: 'a value that the record has finer than the file',
      set: { ...named, 'parameters.values.0.value': 180.4 },
      finds: { stated: 180.4, found: '180' },
    },
    {
      name: 'a parameter that the file lacks',
      set: named,
      files: changed('snow_threshold 0.9\n', ''),
      finds: { subject: 'snow_threshold', message: `${file} has no row for snow_threshold.` },
    },
    {
      name: 'a value that is no number',
      set: named,
      files: changed('snow_threshold 0.9', 'snow_threshold none'),
      finds: { message: `${file} line 4 says "none" for snow_threshold, where a number is expected.` },
    },
    {
      name: 'several rows for one name',
      set: named,
      files: changed('snow_threshold 0.9', 'snow_threshold 0.9\nsnow_threshold 0.9'),
      finds: { message: 'has 2 rows for snow_threshold; name its columns of scopes and layers' },
    },
    {
      name: 'one layer of two, in a table of its own',
      set: {
        'parameters.values': [
          { name: 'ksat', unit: 'mm/h', calibrated: false, value: 12, layer: 1 },
          { name: 'ksat', unit: 'mm/h', calibrated: false, value: 3, layer: 2 },
        ],
        'parameters.model_file': {
          file: 'model/soil.csv',
          separator: 'semicolon',
          decimal: 'comma',
          name: 'par',
          value: 'final',
          layer: 'horizon',
        },
      },
      files: { 'model/soil.csv': 'par;horizon;final\nksat;1;12,0\nksat;2;4,5\n' },
      finds: { subject: 'ksat (layer 2)', stated: 3, found: '4.5' },
    },
    {
      name: 'a column that the file does not have',
      set: {
        'parameters.model_file': { file, separator: 'blank', value: 'final' },
        'parameters.values': [{ name: 'soil_capacity', value: 180 }],
      },
      finds: { message: `${file} has no column \`final\`.` },
    },
  ],
  silent: [
    { name: 'all values', set: named },
    {
      name: 'the record rounds what the file has',
      set: named,
      files: changed('evaporation_factor 0.9', 'evaporation_factor 0.9049'),
    },
    { name: 'no file of the model is named', files: changed('180', '182') },
  ],
});
