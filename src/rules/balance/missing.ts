import { rule } from '../rule.ts';

export const balanceMissing = rule({
  id: 'balance.missing',
  scope: 'manifest',
  from: 'validation',
  means: 'missing',
  statement: 'No water balance of the catchment is recorded.',
  why: 'A good hydrograph can hide water that comes from nowhere; whether rain, flow, evapotranspiration and storage add up is the first thing a reviewer asks.',
  source: {
    basis: 'practice',
    citation: 'Common practice: a simulation is checked for the conservation of water.',
  },
  clear:
    'Add balance.catchment with run, file, inflow, outflow and storage columns. Soil and aquifer may be added alike.',
  check: (_, { manifest }) => {
    const catchment = manifest.data.balance?.catchment;
    const absent = [
      catchment?.inflow === undefined ? 'inflow' : null,
      catchment?.outflow === undefined ? 'outflow' : null,
    ].filter((one) => one !== null);
    if (absent.length === 0) return [];
    return [
      {
        record: 'balance.catchment',
        field: ['balance', 'catchment'],
        message:
          catchment === undefined
            ? 'No water balance of the catchment is recorded.'
            : `The water balance of the catchment names no ${absent.join(' and no ')}.`,
      },
    ];
  },
});
