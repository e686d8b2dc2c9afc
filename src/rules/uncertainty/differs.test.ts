import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { uncertaintyDiffers } from './differs.ts';

const at = 'uncertainty.bands.outlet-flow';

ruleCases(uncertaintyDiffers, {
  fires: [
    {
      name: 'a digit off',
      set: { [`${at}.stated.coverage`]: 0.95 },
      finds: {
        record: 'uncertainty',
        field: `${at}.stated.coverage`,
        subject: 'outlet-flow coverage',
        stated: 0.95,
        found: 0.9325,
        message:
          'The coverage (P-factor) of the band of outlet-flow over validation is stated as 0.95; the files give 0.9325.',
        level: 'block',
      },
    },
    {
      name: 'a width in percent',
      set: { [`${at}.stated.relative_width`]: 83 },
      finds: { found: 0.8305, message: 'The stated figure is in percent, where a share is meant.' },
    },
    {
      name: 'an interval score',
      set: { [`${at}.stated.interval_score`]: 0.3 },
      finds: { found: 0.3954, unit: 'm3/s', message: 'The interval score' },
    },
    {
      name: 'the coverage of validation, stated of calibration',
      set: {
        [`${at}.over`]: 'calibration',
        'periods.validation': ['2003-10-01/2005-09-30'],
        'periods.calibration': ['2007-10-01/2010-09-30'],
        [`${at}.stated`]: { coverage: 0.5 },
      },
      finds: { stated: 0.5, found: 0.9325 },
    },
  ],
  silent: [
    {
      name: 'decimals that are written',
      set: { [`${at}.stated`]: { coverage: 0.932, relative_width: 0.8, interval_score: 0.395 } },
    },
    { name: 'nothing is stated', remove: [`${at}.stated`] },
    { name: 'what can’t be recomputed has another rule', set: { [`${at}.unit`]: 'degC' } },
  ],
});
