import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { balanceBeyondLimit } from './beyond-limit.ts';

const daily = 'runs/calibrated/daily.csv';

/** The daily file with a column multiplied. */
function times(column: string, factor: number) {
  return (old: string): string => {
    const [head = '', ...rows] = old.trimEnd().split('\n');
    const place = head.split(',').indexOf(column);
    const written = rows.map((row) => {
      const cells = row.split(',');
      return cells.with(place, (Number(cells[place]) * factor).toFixed(4)).join(',');
    });
    return `${[head, ...written].join('\n')}\n`;
  };
}

// The sound study has 7237 mm of rain, 3398.8 of flow, 3855.8 of evapotranspiration, as much of potential; the stores give 17.5 mm.
ruleCases(balanceBeyondLimit, {
  fires: [
    {
      name: 'more evaporates than the sun can lift',
      files: { [daily]: times('pet_mm', 0.9) },
      finds: {
        record: 'balance.catchment',
        field: 'balance.catchment',
        subject: 'energy',
        found: 3855.76,
        unit: 'mm',
        message: 'Evapotranspiration of 3 856 is above the potential of 3 470.',
        level: 'block',
      },
    },
    {
      name: 'grass reference under forest or open water warns',
      files: { [daily]: times('pet_mm', 0.9) },
      set: { 'balance.catchment.potential_for': 'grass' },
      finds: { message: 'which is for grass', level: 'warn' },
    },
    {
      name: 'more evaporates than falls, beside imported water',
      files: { [daily]: times('rain_mm', 0.5) },
      set: { 'balance.catchment.inflow.transfer': 'flow_mm' },
      finds: {
        subject: 'water',
        message: 'above the rain of 3 619 and the 17.53 taken from storage; other inflows bring 3 399.',
        level: 'block',
      },
    },
    {
      name: 'more flows out than flows in',
      files: { [daily]: times('flow_mm', 2.2) },
      finds: {
        subject: 'runoff',
        message: 'above all that flows in, 7 237, and the 17.53 taken from storage',
      },
    },
    {
      name: 'rain below zero',
      files: { [daily]: (old) => old.replace(/^(2005-03-01),[^,]*/m, '$1,-1') },
      finds: {
        subject: 'negative precipitation',
        found: -1,
        message: 'precipitation is negative on 1 steps',
      },
    },
    {
      name: 'a term with the wrong sign',
      files: { [daily]: times('et_mm', -1) },
      finds: { subject: 'negative evapotranspiration', found: -3855.76, message: 'or has the wrong sign' },
    },
  ],
  silent: [
    {
      name: 'dew on single days',
      files: { [daily]: (old) => old.replace(/^(2005-03-01,[^,]*,[^,]*),[^,]*/m, '$1,-0.1') },
    },
    {
      name: 'storage left out over so few years that it may have fed the streamflow',
      remove: ['balance.catchment.storage'],
      set: { 'balance.catchment.over': '2003-10-01/2006-09-30' },
      files: { [daily]: times('flow_mm', 2.2) },
    },
    { name: 'nothing can be computed', set: { 'balance.catchment.file': 'runs/calibrated/none.csv' } },
  ],
});
