import { holderOf } from './field.ts';
import type { NamedFile } from './named-files.ts';
import { type Reference, resolveName } from './names.ts';
import { asWhole } from './record.ts';
import type { NamedTable, Stated } from './statements.ts';

/** Files that are looked at without a record depending on them: readings, and lists that records are repeated for. */
export function seenFiles(
  stated: Stated,
  tables: readonly NamedTable[],
): readonly { readonly record: string; readonly file: NamedFile }[] {
  const readings = (stated.manifest.data.readings ?? []).map(({ of, file }, index) => ({
    record: holderOf(of, stated.statements)?.id ?? asWhole,
    file: { pattern: file, field: ['readings', index, 'file'], use: 'seen' as const },
  }));
  return [
    ...readings,
    ...tables.map(({ record, ...table }) => ({ record, file: { ...table, use: 'seen' as const } })),
  ];
}

/** Names that compare without depending, where they stand for nothing. */
export function unknownMentions(
  stated: Stated,
): readonly { readonly record: string; readonly reference: Reference }[] {
  const unknown: { record: string; reference: Reference }[] = [];
  for (const statement of stated.statements.values()) {
    const input = statement.area === 'inputs' ? statement.fragment.compare_with?.input : undefined;
    if (input === undefined || resolveName(`inputs.${input}`, stated) !== null) continue;
    const field = [...statement.field, 'compare_with', 'input'];
    unknown.push({ record: statement.id, reference: { to: `inputs.${input}`, written: input, field } });
  }
  for (const [index, { of }] of (stated.manifest.data.readings ?? []).entries()) {
    if (holderOf(of, stated.statements) !== undefined) continue;
    unknown.push({ record: asWhole, reference: { to: of, written: of, field: ['readings', index, 'of'] } });
  }
  return unknown;
}
