import type { Table } from '../manifest/data.generated.ts';
import type { FieldPath } from '../manifest/manifest.ts';

const separators = { comma: ',', semicolon: ';', tab: '\t', blank: /[ \t]+/ } as const;

/** The path of a table, and where the manifest writes it. */
export function fileOfTable(table: Table, field: FieldPath): { pattern: string; field: FieldPath } {
  return typeof table === 'string'
    ? { pattern: table, field }
    : { pattern: table.file, field: [...field, 'file'] };
}

/** The first column of a table below its line of column names, without what is empty or there already. */
export function namesInTable(text: string, table: Table): readonly string[] {
  const { skip_lines = 0, separator = 'comma', comment } = typeof table === 'string' ? {} : table;
  const lines = text
    .replace(/^\uFEFF/, '')
    .split(/\r?\n/)
    .slice(skip_lines)
    .filter((line) => line.trim() !== '' && (comment === undefined || !line.startsWith(comment)));
  const names = lines.slice(1).map((line) => {
    const [first = ''] = line.trimStart().split(separators[separator]);
    return first.trim().replace(/^"(.*)"$/, '$1');
  });
  return [...new Set(names)].filter((name) => name !== '');
}
