import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { uncertaintyWeak } from './weak.ts';

const band = 'runs/calibrated/band.csv';
const at = 'uncertainty.bands.outlet-flow';

/** Both ends of the band on every day changed by a function. */
function ends(change: (low: number, high: number) => readonly [number, number]) {
  return (old: string): string =>
    old.replace(/^(\d{4}-\d\d-\d\d),([^,]*),(.*)$/gm, (_, date, low, high) =>
      [date, ...change(Number(low), Number(high)).map((value) => value.toFixed(4))].join(','),
    );
}

// The ends of the sound study are 0.8 and 1.25 times the simulated flow, which is 5 to 10 % below the observed one.
const thin = ends((low, high) => [low / 0.8, high / 1.25 + 0.001]);
const wide = ends((low, high) => [low - 0.2, high + 0.2]);

ruleCases(uncertaintyWeak, {
  fires: [
    {
      name: 'a thin band',
      files: { [band]: thin },
      finds: {
        record: 'uncertainty',
        field: at,
        subject: 'outlet-flow coverage validation',
        message:
          /^The band of outlet-flow holds .* % of the observations of validation, where it is meant to hold 95 %\.$/,
        level: 'warn',
      },
    },
    {
      // (0.3331 + 0.4) / 0.3331 x 0.8305 = 1.828
      name: 'a wide band',
      files: { [band]: wide },
      finds: { subject: 'outlet-flow width validation', found: 1.828, message: '1.828 times as wide' },
    },
    {
      name: 'judged over calibration, where it has no values',
      set: {
        [`${at}.over`]: 'calibration',
        'periods.calibration': ['2007-10-01/2010-09-30'],
        'periods.validation': ['2003-10-01/2007-09-30'],
      },
      finds: { subject: 'outlet-flow window', message: 'it has no values over validation' },
    },
    {
      name: 'judged over calibration, and worse in validation',
      set: {
        [`${at}.over`]: 'calibration',
        'periods.calibration': ['2007-10-01/2009-09-30'],
        'periods.validation': ['2009-10-01/2010-09-30'],
      },
      finds: { message: /of validation it holds \d/ },
    },
    {
      name: 'the band of another variable',
      set: {
        'evaluation.outlet-flow.simulated.values': 'rain_mm',
        'evaluation.outlet-flow.simulated.unit': 'mm/d',
      },
      finds: {
        subject: 'outlet-flow simulation',
        message: 'it may belong to another run or another variable',
      },
    },
    {
      name: 'a band of sediment that holds next to nothing',
      set: { 'evaluation.outlet-flow.variable': 'sediment' },
      files: { [band]: thin },
      finds: { message: 'of the observations of validation' },
    },
  ],
  silent: [
    {
      name: 'a wide band of sediment',
      set: { 'evaluation.outlet-flow.variable': 'sediment' },
      files: { [band]: wide },
    },
    { name: 'what can’t be computed', set: { [`${at}.unit`]: 'degC' } },
  ],
});
