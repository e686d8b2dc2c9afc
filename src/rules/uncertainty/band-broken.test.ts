import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { uncertaintyBandBroken } from './band-broken.ts';

const band = 'runs/calibrated/band.csv';
const at = 'uncertainty.bands.outlet-flow';

ruleCases(uncertaintyBandBroken, {
  fires: [
    {
      name: 'both ends changed places on a day',
      files: { [band]: (old) => old.replace(/^(2008-02-01),([^,]*),([^,\n]*)/m, '$1,$3,$2') },
      finds: {
        record: 'uncertainty',
        field: at,
        subject: 'outlet-flow order',
        found: 1,
        message: 'lies above the upper one on 1 steps, first on 2008-02-01',
        level: 'block',
      },
    },
    {
      name: 'columns exchanged',
      set: { [`${at}.lower`]: 'high', [`${at}.upper`]: 'low' },
      finds: { found: 1096, message: 'on 1 096 steps' },
    },
    { name: 'no level', remove: [`${at}.level`], finds: { field: `${at}.level`, message: 'has no level' } },
    { name: 'no unit', remove: [`${at}.unit`], finds: { field: `${at}.unit`, message: 'has no unit' } },
    {
      name: 'a unit that is none of flow',
      set: { [`${at}.unit`]: 'degC' },
      finds: { subject: 'outlet-flow unread', message: 'the observed series: ' },
    },
    {
      name: 'one column only',
      remove: [`${at}.upper`],
      finds: { message: 'it does not name two columns, `lower` and `upper`' },
    },
    {
      // The last year of validation has 365 days.
      name: 'a year of the window is missing',
      files: { [band]: (old) => old.replace(/^(2009-1[0-2]|2010).*\n/gm, '') },
      finds: {
        subject: 'outlet-flow length',
        found: 731,
        message: 'has no values on 365 of the 1 096 observed steps of validation',
        level: 'block',
      },
    },
    {
      name: 'a band that covers only calibration',
      files: {
        [band]: (old) => old.replace(/^20\d\d/gm, (year) => String(Number(year) - 4)),
      },
      finds: { found: 0, message: 'on 1 096 of the 1 096 observed steps of validation' },
    },
    {
      name: 'a window that nobody states',
      remove: ['periods.validation'],
      finds: { subject: 'outlet-flow window', message: 'no validation window is stated' },
    },
    {
      name: 'a target that is none',
      set: {
        'uncertainty.bands': {
          inlet: { file: band, time: 'date', lower: 'low', upper: 'high', level: 0.9, unit: 'm3/s' },
        },
      },
      finds: { message: 'its target names no observed input' },
    },
    { name: 'a note in set-up', phase: 'setup', remove: [`${at}.level`], finds: { level: 'note' } },
  ],
  silent: [
    { name: 'the window is validation unless said', remove: [`${at}.over`] },
    {
      name: 'in mm a day over the catchment’s area',
      set: { [`${at}.unit`]: 'mm/d' },
    },
    {
      name: 'a day that the gauge missed',
      files: { 'data/flow.csv': (old) => old.replace(/^(2008-02-01),.*/m, '$1,NA') },
    },
    { name: 'no bands', remove: ['uncertainty.bands'] },
  ],
});
