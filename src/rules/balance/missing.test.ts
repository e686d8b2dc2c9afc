import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { balanceMissing } from './missing.ts';

ruleCases(balanceMissing, {
  fires: [
    {
      name: 'no balance',
      remove: ['balance'],
      finds: {
        record: 'balance.catchment',
        field: 'balance.catchment',
        level: 'block',
        message: 'No water balance',
      },
    },
    {
      name: 'of the soil only',
      remove: ['balance.catchment'],
      set: { 'balance.soil': { run: 'calibrated', inflow: { rain: 'rain_mm' }, outflow: { et: 'et_mm' } } },
      finds: { record: 'balance.catchment' },
    },
    { name: 'no outflow', remove: ['balance.catchment.outflow'], finds: { message: 'names no outflow' } },
    {
      name: 'neither',
      remove: ['balance.catchment.inflow', 'balance.catchment.outflow'],
      finds: { message: 'names no inflow and no outflow' },
    },
    {
      name: 'only noted while calibrating',
      remove: ['balance'],
      phase: 'calibration',
      finds: { level: 'note' },
    },
  ],
  silent: [{ name: 'storage may be neglected here', remove: ['balance.catchment.storage'] }],
});
