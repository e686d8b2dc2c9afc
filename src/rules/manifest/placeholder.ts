import { type FieldPath, fieldName } from '../../manifest/manifest.ts';
import type { RecordNode, Records } from '../../records/record.ts';
import { rule } from '../rule.ts';
import { isStandIn } from '../stand-in.ts';

/** Keys whose text tells a reader something; codes, columns, words of commands and patterns may well be `-` or `?`. */
const telling: ReadonlySet<string | number> = new Set([
  'affiliation',
  'algorithm',
  'asks',
  'because',
  'by',
  'chosen',
  'cites',
  'collected_by',
  'decision',
  'evidence',
  'gaps_treated',
  'gives',
  'how',
  'justification',
  'kind',
  'left_out_because',
  'licence',
  'may_be_negative_because',
  'method',
  'name',
  'none_because',
  'objective',
  'provider',
  'purpose',
  'range_from',
  'rejected_because',
  'release',
  'response',
  'role',
  'says',
  'scope',
  'states',
  'step',
  'storage_neglected_because',
  'strategy',
  'title',
  'topic',
  'treated',
  'version',
  'zero_because',
]);

/** Sections whose reasons and names `waiver.unsigned` looks at. */
const signed: ReadonlySet<string> = new Set(['waivers', 'departures', 'accepts']);

export const manifestPlaceholder = rule({
  id: 'manifest.placeholder',
  scope: 'manifest',
  from: 'calibration',
  means: 'incomplete',
  statement: 'A text is empty or a stand-in: todo, tbd, xxx, unknown, n/a, ?, -, “as usual”.',
  why: 'A stand-in looks like an answer and is none: the reader of an archived model learns neither the gauge, nor the reason, nor the release.',
  source: { basis: 'practice', citation: 'Common practice: a record is filled in before it is relied on.' },
  clear: 'Write what is so; where it is truly not known, say who was asked and when.',
  check: (_, { manifest, records }) =>
    standIns(manifest.data, []).map(({ field, text }) => ({
      record: recordOf(field, records),
      field,
      subject: fieldName(field),
      stated: text,
      message:
        text.trim() === ''
          ? `\`${fieldName(field)}\` is empty.`
          : `\`${fieldName(field)}\` says \`${text.trim()}\`, which stands in for an answer.`,
      ...(field[0] === 'model' ? { from: 'setup' as const } : {}),
    })),
});

/** Every stand-in below a node, with its field. */
function standIns(node: unknown, field: FieldPath): readonly { field: FieldPath; text: string }[] {
  if (typeof node === 'object' && node !== null) {
    return Object.entries(node).flatMap(([key, value]) =>
      signed.has(key) ? [] : standIns(value, [...field, Array.isArray(node) ? Number(key) : key]),
    );
  }
  const key = field.findLast((part) => typeof part === 'string') ?? '';
  return typeof node === 'string' && telling.has(key) && isStandIn(node) ? [{ field, text: node }] : [];
}

function recordOf(field: FieldPath, { nodes }: Records): string {
  const holds = (record: RecordNode) => record.field.every((part, place) => part === field[place]);
  return [...nodes.values()].find(holds)?.id ?? 'manifest';
}
