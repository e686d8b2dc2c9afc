import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { balanceStorageUnstated } from './storage-unstated.ts';

const daily = 'runs/calibrated/daily.csv';

/** A column more, that grows by an amount a day. */
function filling(column: string, mmPerDay: number) {
  return (old: string): string => {
    const [head = '', ...rows] = old.trimEnd().split('\n');
    const written = rows.map((row, place) => `${row},${(1000 + place * mmPerDay).toFixed(4)}`);
    return `${[`${head},${column}`, ...written].join('\n')}\n`;
  };
}

ruleCases(balanceStorageUnstated, {
  fires: [
    {
      // The leak of METHODS: 0.1 mm a day over 2557 days, 255.7 mm of 7237.
      name: 'a leak that hides in a store',
      set: { 'balance.catchment.storage': ['soil_mm', 'groundwater_mm', 'deep_mm'] },
      files: { [daily]: filling('deep_mm', 0.1) },
      finds: {
        record: 'balance.catchment',
        field: 'balance.catchment.storage',
        subject: 'deep_mm',
        found: 255.7,
        unit: 'mm',
        message: 'deep_mm fills in every one of 7 years, by 255.7 mm in all, 3.533 % of the inflow.',
        level: 'warn',
      },
    },
    {
      name: 'a store that was filled at the start and only empties',
      set: { 'balance.catchment.storage': ['soil_mm', 'groundwater_mm', 'deep_mm'] },
      files: { [daily]: filling('deep_mm', -0.1) },
      finds: { found: -255.7, message: 'the flows are fed by water that was there at the start' },
    },
    {
      // 2004: 20.856 + 44.1395 of 987 mm.
      name: 'a year in which much comes out of storage',
      set: { 'balance.catchment.over': '2003-10-01/2004-09-30' },
      finds: { subject: 'change', found: -65, message: '6.585 % of the inflow, came out of storage' },
    },
    {
      name: 'storage left out over three years, whatever the reason',
      remove: ['balance.catchment.storage'],
      set: {
        'balance.catchment.over': '2003-10-01/2006-09-30',
        'balance.catchment.storage_neglected_because': 'it is small',
      },
      finds: { subject: 'left out', message: 'Storage is left out over 3 complete years' },
    },
    {
      name: 'storage left out without a word',
      remove: ['balance.catchment.storage'],
      finds: { message: 'nothing says why that is tolerable' },
    },
  ],
  silent: [
    {
      name: 'storage left out over seven years, with a reason',
      remove: ['balance.catchment.storage'],
      set: { 'balance.catchment.storage_neglected_because': 'seven years' },
    },
    {
      name: 'a store that rises for four years only',
      set: {
        'balance.catchment.storage': ['soil_mm', 'groundwater_mm', 'deep_mm'],
        'balance.catchment.over': '2004-10-01/2008-09-30',
      },
      files: { [daily]: filling('deep_mm', 0.05) },
    },
    {
      // 0.02 mm a day over 2557 days is 0.7 % of the rain.
      name: 'a store that rises by little',
      set: { 'balance.catchment.storage': ['soil_mm', 'groundwater_mm', 'deep_mm'] },
      files: { [daily]: filling('deep_mm', 0.02) },
    },
    { name: 'nothing can be computed', set: { 'balance.catchment.file': 'runs/calibrated/none.csv' } },
  ],
});
