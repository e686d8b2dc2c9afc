import type { ProfiledFile } from '../../facts/profiles.ts';
import type { RecordNode } from '../../records/record.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { columnIn, listPlaces } from './data-place.ts';
import { isAmount, undeclaredCode } from './undeclared-code.ts';

export const inputsNegativeAmount = rule({
  id: 'inputs.negative-amount',
  scope: 'inputs',
  from: 'setup',
  means: 'contradicted',
  statement:
    'Rain, flow, evapotranspiration or a concentration below zero, and nothing says why; or a customary code for a missing value (-9.9, -99, -999, -9999) that is not declared and counts as a value.',
  why: 'One -9999 among daily flows takes more water out of the balance than the river carries in years; a code read as a value spoils every mean and score above it.',
  source: { basis: 'definition', citation: 'An amount of water is not below zero.' },
  clear:
    'Declare the code in `series.missing`, mend the values, or say in `may_be_negative_because` why they are right (tidal flow, dew).',
  check: (record, { profiles }) =>
    (profiles.get(record.name ?? '')?.files ?? []).flatMap((file) => [
      ...codesAmongValues(file, record),
      ...codesRefused(file, record),
      ...belowZero(file, record),
    ]),
});

/** Below this no air is (the lowest is -89.2 degC, Vostok 1983; WMO archive of extremes, from memory), so that a nines code is one. */
const coldest = -90;

function codesAmongValues(file: ProfiledFile, { id, fragment }: RecordNode<'inputs'>): readonly Draft[] {
  const { role, may_be_negative_because: reason } = fragment;
  return file.columns.flatMap((column) =>
    column.suspectedCodes.flatMap(({ value, count, line, time }) => {
      const doubted = isAmount(role) ? reason === undefined : role === 'temperature' && value < coldest;
      if (!doubted) return [];
      return {
        record: id,
        file: file.path,
        line,
        subject: `${file.path} ${column.name} code ${value}`,
        found: value,
        message: `${columnIn(file, column)} holds ${value} ${times(count)} as a value, first on ${time} (line ${line}); it looks like a code for a missing value that \`series.missing\` does not declare.`,
        clear: `If it marks a missing value, say \`missing: [${value}]\` in \`series\`; else mend the values.`,
      };
    }),
  );
}

function codesRefused(
  { path, problems }: ProfiledFile,
  { id, fragment }: RecordNode<'inputs'>,
): readonly Draft[] {
  const refused = problems.first.filter((problem) => undeclaredCode(problem) !== null);
  const [first] = refused;
  if (first === undefined || !isAmount(fragment.role)) return [];
  const code = undeclaredCode(first) ?? '';
  const onlyCodes = refused.length === problems.first.length;
  const count = onlyCodes ? problems.total : refused.length;
  return [
    {
      record: id,
      file: path,
      ...(first.line === null ? {} : { line: first.line }),
      subject: `${path} code ${code}`,
      found: Number(code),
      message: `${path} holds ${code} in ${onlyCodes ? '' : 'at least '}${figure(count)} ${count === 1 ? 'row' : 'rows'}, first in line ${first.line}; it looks like a code for a missing value that \`series.missing\` does not declare.`,
      clear: `If it marks a missing value, say \`missing: [${code}]\` in \`series\`; else mend the values.`,
    },
  ];
}

function belowZero(file: ProfiledFile, { id, fragment }: RecordNode<'inputs'>): readonly Draft[] {
  const { role, series, may_be_negative_because: reason } = fragment;
  if (!isAmount(role) || reason !== undefined) return [];
  return file.columns.flatMap((column) => {
    const codes = column.suspectedCodes.reduce((sum, { count }) => sum + count, 0);
    const total = column.negative.total - codes;
    const isCode = (value: number) => column.suspectedCodes.some((code) => code.value === value);
    const shown = column.negative.first.filter(({ value }) => !isCode(value));
    const [first] = shown;
    if (total <= 0 || first === undefined) return [];
    return {
      record: id,
      file: file.path,
      line: first.line,
      subject: `${file.path} ${column.name}`,
      found: first.value,
      ...(series?.unit === undefined ? {} : { unit: series.unit }),
      message: `${columnIn(file, column)} is below zero ${times(total)}: ${listPlaces(
        { total, first: shown },
        ({ time, value }) => `${value} on ${time}`,
      )}.`,
    };
  });
}

function times(count: number): string {
  return count === 1 ? 'once' : `${figure(count)} times`;
}
