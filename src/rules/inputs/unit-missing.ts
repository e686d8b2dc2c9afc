import { rule } from '../rule.ts';
import { cfUnits } from '../sources.ts';

export const inputsUnitMissing = rule({
  id: 'inputs.unit-missing',
  scope: 'inputs',
  from: 'setup',
  means: 'incomplete',
  statement: 'A series or a raster has no unit.',
  why: 'Tenths of a millimetre read as millimetres, or cubic feet as cubic metres, give a model that can be calibrated and is wrong in every balance.',
  source: cfUnits,
  clear:
    'Write `series.unit` (such as mm/d, m3/s, degC), or for a raster `grid.unit`, the unit of its cell size.',
  check: ({ id, field, fragment }) =>
    (['series', 'grid'] as const)
      .filter((key) => fragment[key] !== undefined && !fragment[key].unit?.trim())
      .map((key) => ({
        record: id,
        field: [...field, key, 'unit'],
        subject: key,
        message:
          key === 'series'
            ? 'The values of this series have no unit.'
            : 'The cell size of this raster has no unit.',
      })),
});
