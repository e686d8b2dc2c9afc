import type { RestatedField } from '../../facts/restated.ts';

const shownAtMost = 5;
const longest = 60;

/** What a record states otherwise than when it was sealed, a line for each field: `area.value: 50 -> 51`. */
export function restatement(fields: readonly RestatedField[]): readonly string[] {
  const more = fields.length - shownAtMost;
  return [
    ...fields
      .slice(0, shownAtMost)
      .map(({ field, was, now }) => `${field === '' ? '' : `${field}: `}${written(was)} -> ${written(now)}`),
    ...(more > 0 ? [`and ${more} more ${more === 1 ? 'field' : 'fields'}`] : []),
  ];
}

function written(value: unknown): string {
  if (value === undefined || value === null) return 'nothing';
  const text = typeof value === 'object' ? JSON.stringify(value) : String(value);
  return text.length > longest ? `${text.slice(0, longest - 4)} ...` : text;
}
