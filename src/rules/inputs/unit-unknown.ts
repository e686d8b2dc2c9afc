import { isDefined } from '../../hydrology/paired.ts';
import { parseUnit } from '../../series/units/parse-unit.ts';
import { unitUnfitFor } from '../../series/units/role.ts';
import { rule } from '../rule.ts';
import { cfUnits } from '../sources.ts';

export const inputsUnitUnknown = rule({
  id: 'inputs.unit-unknown',
  scope: 'inputs',
  from: 'setup',
  means: 'contradicted',
  statement:
    'A unit can’t be read as the CF conventions write units, or does not measure what the role calls for.',
  why: 'Every total, balance and score is converted by the unit; one that is read otherwise than meant moves them by its factor.',
  source: cfUnits,
  clear: 'Write the unit as mm/d, mm d-1, m3/s, m3 s-1, ML/d, degC, mg/L or 1 (for none).',
  check: ({ id, field, fragment: { role = 'other', series, grid } }) =>
    (
      [
        ['series', 'unit', series?.unit, (unit: string) => unitUnfitFor(role, unit)],
        ['grid', 'unit', grid?.unit, unreadable],
        ['grid', 'values_unit', grid?.values_unit, (unit: string) => unitUnfitFor(role, unit)],
      ] as const
    ).flatMap(([part, key, unit, fault]) => {
      const reason = unit === undefined || unit.trim() === '' ? null : fault(unit);
      if (unit === undefined || reason === null) return [];
      return {
        record: id,
        field: [...field, part, key],
        subject: `${part}.${key}`,
        stated: unit,
        message: `This unit does not serve: ${reason}.`,
      };
    }),
});

function unreadable(unit: string): string | null {
  const parsed = parseUnit(unit);
  return isDefined(parsed) ? null : parsed.undefined;
}
