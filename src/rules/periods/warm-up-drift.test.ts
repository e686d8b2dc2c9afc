import { expect } from 'vitest';
import { editColumn, waterYear } from '../../../tests/harness/columns.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { parseDate } from '../../series/calendar.ts';
import { periodsWarmUpDrift } from './warm-up-drift.ts';

/** A store of `start` mm at the end of the warm-up that moves by so many mm in each year of 365.25 days. */
const drifting = (mmPerYear: number, start = 300) => ({
  'runs/calibrated/daily.csv': editColumn('groundwater_mm', (date) => {
    const days = (parseDate(date) ?? 0) - (parseDate('2003-09-30') ?? 0);
    return start + (mmPerYear * days) / 365.25;
  }),
});
/** A thousand mm a year, but for leap days. */
const steadyRain = { 'data/rain.csv': editColumn('rain_mm', () => 1000 / 365) };
const stores = 'runs.calibrated.stores';
const inMm = { [`${stores}.unit`]: 'mm' };

ruleCases(periodsWarmUpDrift, {
  fires: [
    {
      name: 'a store that loses 3 % of the rain each year',
      files: { ...steadyRain, ...drifting(-30) },
      set: inMm,
      finds: {
        record: 'runs.calibrated',
        field: stores,
        subject: 'groundwater_mm',
        level: 'warn',
        unit: 'mm a-1',
        // 8 values in strict order: S = -28, Var = 65.33, Z = -3.34, p = 0.0008.
        message:
          /groundwater_mm still falls by 30 mm a year on the same date .*2\.998 % of the annual rain.*p = 0\.0008\d* over 8 yearly/,
        detail: [],
      },
    },
    {
      name: 'a store that gains',
      files: { ...steadyRain, ...drifting(20) },
      set: inMm,
      finds: { message: 'still rises by 20' },
    },
    {
      name: 'under five years, where a test can’t tell',
      files: { ...steadyRain, ...drifting(-30, 400) },
      set: { ...inMm, 'runs.calibrated.warm_up': '2001-10-01/2007-09-30' },
      finds: { message: /falls by 29\.99 mm.*With 4 yearly values a test can’t tell drift from weather/ },
    },
    {
      name: 'with the rain that falls too',
      files: {
        ...drifting(-30),
        'data/rain.csv': editColumn('rain_mm', (date) => 4 - 0.2 * (waterYear(date) - 2002)),
      },
      set: inMm,
      finds: { detail: ['the rain falls too over these years, so the climate may be the cause'] },
    },
    {
      name: 'no rain to compare with: a change of more than 1 % a year with a trend',
      files: drifting(5),
      set: { ...inMm, 'runs.calibrated.takes': ['inputs.temperature'] },
      finds: { subject: 'groundwater_mm', message: 'rises by 5 mm' },
    },
    {
      name: 'stores in another unit of depth',
      files: { ...steadyRain, ...drifting(3, 30) },
      set: {
        [stores]: {
          file: 'runs/calibrated/daily.csv',
          time: 'date',
          values: 'groundwater_mm',
          unit: 'cm',
          step: 'P1D',
        },
      },
      finds: { message: 'rises by 30' },
    },
    {
      name: 'no unit: held against nothing, so a trend of more than 1 % a year counts',
      files: { ...steadyRain, ...drifting(9) },
      finds: { message: 'rises by 9 a year', detail: [expect.stringContaining('not held against the rain')] },
    },
    {
      name: 'a column that is not there',
      set: { [`${stores}.values`]: ['snow_mm'] },
      finds: { subject: 'unread', message: 'expected a column named "snow_mm"' },
    },
  ],
  silent: [
    { name: 'less than 1 % of the rain', files: { ...steadyRain, ...drifting(9) }, set: inMm },
    { name: 'less than 1 % of the store', files: { ...steadyRain, ...drifting(-20, 5000) } },
    {
      name: 'a store that goes up and down',
      files: {
        ...steadyRain,
        'runs/calibrated/daily.csv': editColumn('groundwater_mm', (date) => 300 + 40 * (waterYear(date) % 2)),
      },
    },
    { name: 'no stores are stated', remove: [stores], files: drifting(-30) },
    { name: 'no warm-up is stated', remove: ['periods.warm_up'], files: drifting(-30) },
    {
      name: 'a drift that ends with the warm-up',
      files: {
        ...steadyRain,
        'runs/calibrated/daily.csv': editColumn('groundwater_mm', (date) =>
          date <= '2003-09-30' ? 300 + (parseDate('2003-09-30') ?? 0) - (parseDate(date) ?? 0) : 300,
        ),
      },
    },
  ],
});
