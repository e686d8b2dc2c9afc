import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { parametersImplausible } from './implausible.ts';

const withHandbook = (value: number, unit: string, handbook: object) => ({
  set: { 'parameters.values': [{ name: 'p', unit, calibrated: false, value, handbook }] },
});
const own = (value: number, handbook: object, rows: string) => ({
  set: {
    'parameters.values': [{ name: 'p', unit: 'mm', calibrated: false, value, handbook }],
    'parameters.handbook_tables': {
      interception: {
        table: 'data/interception.csv',
        unit: 'cm',
        source: 'Eastmoor Rivers Office, report 5, table 2',
      },
    },
  },
  files: { 'data/interception.csv': rows },
});
const weedy = 'minor stream on plain, sluggish reaches, weedy, deep pools';

ruleCases(parametersImplausible, {
  fires: [
    {
      // Chow 1959, Table 5-6: 0.050 to 0.080.
      name: 'a roughness outside its class',
      ...withHandbook(0.03, 's m-1/3', { table: 'manning-n', class: weedy }),
      finds: {
        record: 'parameters',
        field: 'parameters.values[0].value',
        subject: 'p',
        stated: '0.05 to 0.08',
        found: 0.03,
        message: `p is 0.03; ${weedy} has 0.05 to 0.08.`,
        level: 'warn',
      },
    },
    {
      // 1 / 15 = 0.067.
      name: 'Strickler’s coefficient in place of n',
      ...withHandbook(15, 'm1/3 s-1', { table: 'manning-n', class: weedy }),
      finds: { message: 'It looks like Strickler’s coefficient, 1/n.', level: 'block' },
    },
    {
      // TR-55: 61 on B; NEH-4 Table 10.1 from dry to wet: 40 + 0.1 x 11 = 41.1 and 78 + 0.1 x 7 = 78.7.
      name: 'a curve number beyond a wet catchment’s',
      ...withHandbook(80, '1', { table: 'curve-number', class: 'Open space, good', soil_group: 'B' }),
      finds: { stated: '41.1 to 78.7', level: 'warn' },
    },
    {
      name: 'a curve number above 100',
      ...withHandbook(104, '1', { table: 'curve-number', class: 'woods, fair' }),
      finds: { message: 'Nothing has such a value.', level: 'block' },
    },
    {
      // Rawls et al. 1982: sand 210 mm/h; Carsel & Parrish 1988: 712.8 cm/d = 297 mm/h; 1e-7 m/s = 0.36 mm/h.
      name: 'a sand that drains like clay, in m/s',
      ...withHandbook(1e-7, 'm/s', { table: 'saturated-conductivity', class: 'sand' }),
      finds: { stated: '2.1 to 29 700 mm/h', found: 1e-7, unit: 'm/s', level: 'warn' },
    },
    {
      name: 'a conductivity in a unit of length',
      ...withHandbook(10, 'mm', { table: 'saturated-conductivity', class: 'sand' }),
      finds: { subject: 'p class', message: 'can’t be held against its handbook' },
    },
    {
      name: 'a class that the table does not have',
      ...withHandbook(60, '1', { table: 'curve-number', class: 'pasture, goood' }),
      finds: { message: 'the table has no class "pasture, goood"; did you mean "pasture, good"?' },
    },
    {
      name: 'a part of a class’s name',
      ...withHandbook(0.05, '1', { table: 'manning-n', class: 'sluggish reaches' }),
      finds: {
        message: `the table has no class "sluggish reaches"; it has "${weedy}", "minor stream`,
      },
    },
    {
      name: 'a class that is like none',
      ...withHandbook(60, 'mm/h', { table: 'saturated-conductivity', class: 'peat' }),
      finds: { message: 'it has "sand", "loamy sand", "sandy loam", "loam", "silt" and 7 more' },
    },
    {
      name: 'a table that is not known',
      ...withHandbook(60, '1', { table: 'albedo', class: 'snow' }),
      finds: {
        message: 'there is no table albedo; known are manning-n, curve-number, saturated-conductivity',
      },
    },
    {
      name: 'outside a table of the project’s own, in another unit',
      ...own(7, { table: 'interception', class: 'heather' }, 'class,low,high\nheather,0.1,0.5\n'),
      finds: { stated: '0.1 to 0.5 cm', found: 7, detail: ['Eastmoor Rivers Office, report 5, table 2'] },
    },
    {
      name: 'a class that the own table has for other soils',
      ...own(
        7,
        { table: 'interception', class: 'heather', soil_group: 'A' },
        'class,soil_group,low,high\nheather,D,0.1,1\n',
      ),
      finds: { message: 'interception has no class "heather" for soil group A' },
    },
    {
      name: 'an own table that can’t be read',
      ...own(7, { table: 'interception', class: 'heather' }, 'class,low,high\nheather,0.5,0.1\n'),
      finds: {
        message: 'data/interception.csv line 2: expected a class, and numbers `low` and `high` in that order',
      },
    },
  ],
  silent: [
    { name: 'inside its class', ...withHandbook(0.08, '1', { table: 'manning-n', class: weedy }) },
    {
      name: 'where the table leaves its end open',
      ...withHandbook(0.5, '1', { table: 'manning-n', class: 'lined or built-up, asphalt, rough' }),
    },
    {
      name: 'inside the own table',
      ...own(3, { table: 'interception', class: 'Heather' }, 'class,low,high\nheather,0.1,0.5\n'),
    },
  ],
});
