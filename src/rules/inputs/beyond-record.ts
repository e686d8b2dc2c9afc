import type { ColumnProfile } from '../../facts/profiles/column-profile.ts';
import type { LargestAmount } from '../../facts/profiles/rain-extremes.ts';
import type { ProfiledFile } from '../../facts/profiles.ts';
import { rainfallBound } from '../../hydrology/forcing/rainfall-bound.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { columnIn } from './data-place.ts';

export const inputsBeyondRecord = rule({
  id: 'inputs.beyond-record',
  scope: 'inputs',
  from: 'setup',
  means: 'contradicted',
  statement:
    'More rain than was ever measured on earth: above 1 825 mm within 24 hours, or above 26 470 mm within twelve months.',
  why: 'Such a value is a missing code, an accumulated total, a slipped decimal or another unit; a single one outweighs years of rain in the balance.',
  source: {
    basis: 'published',
    citation:
      'World Meteorological Organization, World Weather and Climate Extremes Archive (24 hours: Foc-Foc, La Réunion, 1966; 12 months: Cherrapunji, 1860-1861), and WMO press release 988',
  },
  clear: 'Mend the values, declare the code in `series.missing`, or correct `series.unit`.',
  check: ({ id, name, fragment: { role } }, { profiles }) =>
    role !== 'precipitation'
      ? []
      : (profiles.get(name ?? '')?.files ?? []).flatMap((file) =>
          file.columns.flatMap((column): readonly Draft[] => [
            ...beyond(id, file, column, column.rain?.day ?? null, 24, '24 hours'),
            ...beyond(id, file, column, column.rain?.year ?? null, 366 * 24, 'twelve months'),
          ]),
        ),
});

function beyond(
  record: string,
  file: ProfiledFile,
  column: ColumnProfile,
  largest: LargestAmount | null,
  hours: number,
  duration: string,
): readonly Draft[] {
  const bound = rainfallBound(hours);
  if (largest === null || !isDefined(bound) || largest.mm <= bound.value.mm) return [];
  const { first, last, mm } = largest;
  const when =
    first.line === last.line
      ? `on ${first.time} (line ${first.line})`
      : `from ${first.time} (line ${first.line}) to ${last.time}`;
  return [
    {
      record,
      file: file.path,
      line: first.line,
      subject: `${file.path} ${column.name} ${duration}`,
      found: Number(mm.toPrecision(6)),
      unit: 'mm',
      message: `${columnIn(file, column)} has ${figure(mm)} mm of rain within ${duration}, ${when}; the most ever measured is ${figure(bound.value.mm)} mm (${bound.value.where}).`,
    },
  ];
}
