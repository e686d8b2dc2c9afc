import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { balanceDiffers } from './differs.ts';

const daily = 'runs/calibrated/daily.csv';

ruleCases(balanceDiffers, {
  fires: [
    {
      name: 'a digit off, in the record that states it',
      set: { 'balance.catchment.stated.runoff_ratio': 0.48 },
      finds: {
        record: 'balance.catchment',
        field: 'balance.catchment.stated.runoff_ratio',
        stated: 0.48,
        found: 0.469638,
        message:
          'The runoff ratio of the water balance of catchment is stated as 0.48; the files give 0.469638.',
        level: 'block',
      },
    },
    {
      // Of the file: 3372.7 / 7184 over calibration alone would differ; the total of the rain over its four years is 987 + 981 + 1071 + 1161.
      name: 'a total of another window',
      set: { 'balance.catchment.stated.totals.precipitation': 4200 },
      finds: { found: 7237, unit: 'mm', message: 'The stated figure is that of calibration.' },
    },
    {
      name: 'the storage change with the other sign',
      set: { 'balance.catchment.stated.storage_change': 17.5 },
      finds: { found: -17.5326, unit: 'mm', message: 'The stated figure has the other sign.' },
    },
    {
      name: 'an aridity in percent',
      set: { 'balance.catchment.stated.aridity': 53.3 },
      finds: { found: 0.532784, message: 'The stated figure is in percent, where a share is meant.' },
    },
    {
      name: 'a total of a term that is not named',
      set: { 'balance.catchment.stated.totals.pumping': 12 },
      finds: { message: 'can’t be computed: no such term is named', level: 'block' },
    },
    {
      name: 'a ratio without a term of its name, which may be right',
      set: { 'balance.catchment.outflow': { 'base flow': 'flow_mm', evapotranspiration: 'et_mm' } },
      finds: { message: 'no outflow is named `streamflow`', level: 'warn' },
    },
    {
      name: 'a column that the file lacks',
      set: { 'balance.catchment.outflow.pumping': 'pumped_mm' },
      finds: { field: 'balance.catchment', message: 'can’t be computed', level: 'block' },
    },
    {
      name: 'a value that is missing in the window',
      set: { 'balance.catchment.missing': ['NA'] },
      files: { [daily]: (old) => old.replace(/^(2005-03-01),[^,]*/m, '$1,NA') },
      finds: { message: 'rain_mm has 1 missing values in the window' },
    },
    {
      name: 'a day that is missing in the window',
      files: { [daily]: (old) => old.replace(/^2005-03-01,.*\n/m, '') },
      finds: { message: '1 of the 2557 steps of the window are not in it' },
    },
    {
      name: 'a window that begins with the file',
      set: {
        'balance.catchment.over': '2001-10-01/2005-09-30',
        'periods.warm_up': { zero_because: 'settled' },
      },
      finds: { message: 'what was stored before is not known (`storage_before`)' },
    },
    {
      name: 'units that do not go together',
      set: { 'balance.catchment.outflow.streamflow': { values: 'flow_m3s', unit: 'degC' } },
      finds: { message: 'flow_m3s: ' },
    },
    {
      name: 'a unit that is no flow of water',
      set: { 'balance.catchment.unit': 'kg/d' },
      finds: { message: 'kg/d is no flow of water; state amounts for each step' },
    },
    {
      name: 'a volume besides the catchment without its flows',
      set: {
        'balance.soil': { run: 'calibrated', file: daily, time: 'date', outflow: { evaporation: 'et_mm' } },
      },
      finds: { record: 'balance.soil', message: 'it names no inflow' },
    },
  ],
  silent: [
    { name: 'no figure is stated', remove: ['balance.catchment.stated'] },
    {
      name: 'decimals that are written',
      set: {
        'balance.catchment.stated': {
          residual_share: 0,
          runoff_ratio: 0.47,
          evaporative_ratio: 0.5328,
          aridity: 0.533,
          storage_change: -17.53,
          totals: { precipitation: 7237, streamflow: 3398.8, evapotranspiration: 3855.76 },
        },
      },
    },
    {
      // 3398.7712 mm over 50 km2, flow in m3/s: mm/d x 50 000 / 86 400.
      name: 'a flow in m3/s over the catchment’s area',
      set: { 'balance.catchment.outflow.streamflow': { values: 'flow_m3s', unit: 'm3/s' } },
    },
    {
      name: 'the whole in mm/d, storage as amounts',
      set: { 'balance.catchment.unit': 'mm/d' },
    },
    { name: 'no unit: amounts as they stand', remove: ['balance.catchment.unit'] },
    {
      name: 'the file’s first day, with what was stored before',
      set: {
        'balance.catchment.over': 'simulation',
        'balance.catchment.storage_before': 180,
        'periods.warm_up': { zero_because: 'settled' },
        'balance.catchment.stated': { residual_share: 0.0 },
      },
    },
  ],
});
