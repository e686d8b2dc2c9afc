import { sha256OfJson } from './canonical.ts';
import { type RecordNode, sha256Of } from './record.ts';

/**
 * Digest of what a record itself brings forth: the outputs of a run, the values of parameters. Null for other
 * records, and where nothing is brought forth yet. When what lies below changes, this should move; when files are only
 * called otherwise, it should not.
 */
export function outcomeOf(record: RecordNode): string | null {
  if (record.area !== 'runs' && record.area !== 'parameters') return null;
  const isOutcome = ({ field }: { readonly field: RecordNode['field'] }): boolean =>
    field[record.field.length] === (record.area === 'runs' ? 'gives' : 'table');
  const claimed = [...record.claims.values()].filter(isOutcome).map(({ identity }) => sha256Of(identity));
  const elsewhere = record.elsewhere.filter(isOutcome).map(({ sha256 = null }) => sha256);
  const files = [...claimed, ...elsewhere].map(String).sort();
  const values = valuesOf(record);
  return values.length + files.length === 0 ? null : sha256OfJson({ files, values });
}

function valuesOf({ area, fragment }: RecordNode): readonly unknown[] {
  if (area !== 'parameters') return [];
  const { values = [] } = fragment as RecordNode<'parameters'>['fragment'];
  return values.map(({ name, value, by }) => ({ name, value, by }));
}
