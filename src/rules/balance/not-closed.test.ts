import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { balanceNotClosed } from './not-closed.ts';

const daily = 'runs/calibrated/daily.csv';

/** A column of the daily file changed by a function of its value, on days from one to another. */
function changed(column: string, change: (value: number) => number, from = '0', to = '9') {
  return (old: string): string => {
    const [head = '', ...rows] = old.trimEnd().split('\n');
    const place = head.split(',').indexOf(column);
    const written = rows.map((row) => {
      const cells = row.split(',');
      const [date = ''] = cells;
      if (date < from || date > to) return row;
      return cells.with(place, change(Number(cells[place])).toFixed(4)).join(',');
    });
    return `${[head, ...written].join('\n')}\n`;
  };
}

ruleCases(balanceNotClosed, {
  fires: [
    {
      // 3398.7712 mm of streamflow left out of 7237 mm.
      name: 'an outflow is left out',
      set: { 'balance.catchment.outflow': { evapotranspiration: 'et_mm' } },
      finds: {
        record: 'balance.catchment',
        field: 'balance.catchment',
        found: 0.4696,
        message: 'of 7 237 mm that flow in, 3 399 mm (46.96 %) neither flow out nor are stored',
        detail: [
          '2003-10-01 to 2010-09-30, in (mm): precipitation 7 237; out: evapotranspiration 3 856; stored: -17.53',
        ],
        level: 'block',
      },
    },
    {
      // 2 % of 3855.7578 mm = 77.1 mm, 1.066 % of 7237.
      name: 'more evaporates than is taken from the soil',
      files: { [daily]: changed('et_mm', (mm) => mm * 1.02) },
      finds: { message: '(1.066 %) more flow out or are stored than flow in', level: 'block' },
    },
    {
      // 1 % of it is 0.53 % of the inflow.
      name: 'above 0.1 % warns',
      files: { [daily]: changed('et_mm', (mm) => mm * 0.99) },
      finds: { found: 0.005328, level: 'warn' },
    },
    {
      name: 'a project that asks for more',
      files: { [daily]: changed('et_mm', (mm) => mm * 0.99) },
      set: {
        departures: [
          { threshold: 'balance.residual_share', now: 0.005, because: 'the model closes exactly' },
        ],
      },
      finds: { level: 'block' },
    },
    {
      // The soil changes by -1.07 mm in all (0.015 % of 7237), and by -20.856 mm in 2004 (2.113 % of 987).
      name: 'faults of single years cancel',
      set: { 'balance.catchment.storage': ['groundwater_mm'] },
      finds: {
        subject: 'year',
        found: 0.02113,
        message: 'but not in 2004: 2.113 % of that year’s inflow is missing',
        level: 'warn',
      },
    },
    {
      name: 'flow of a smaller area',
      set: {
        'balance.catchment.outflow.streamflow': { values: 'flow_m3s', unit: 'm3/s' },
        'balance.catchment.area': { value: 45, unit: 'km2' },
      },
      finds: { message: 'more flow out or are stored than flow in', level: 'block' },
    },
    {
      name: 'an aquifer that loses water',
      set: {
        'balance.aquifer': {
          run: 'calibrated',
          file: daily,
          time: 'date',
          unit: 'mm',
          inflow: { recharge: 'rain_mm' },
          outflow: { 'base flow': 'flow_mm' },
          storage: 'groundwater_mm',
        },
      },
      finds: { record: 'balance.aquifer', level: 'block' },
    },
    {
      name: 'a note before validation',
      phase: 'calibration',
      set: { 'balance.catchment.outflow': { evapotranspiration: 'et_mm' } },
      finds: { level: 'note' },
    },
  ],
  silent: [
    { name: 'over calibration', set: { 'balance.catchment.over': 'calibration' } },
    { name: 'over a day without rain', set: { 'balance.catchment.over': '2004-02-29/2004-02-29' } },
    { name: 'an hour’s columns in metres', set: { 'balance.catchment.unit': 'm' } },
    { name: 'nothing can be computed', set: { 'balance.catchment.file': 'runs/calibrated/none.csv' } },
  ],
});
