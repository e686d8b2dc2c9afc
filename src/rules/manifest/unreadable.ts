import { rule } from '../rule.ts';

export const manifestUnreadable = rule({
  id: 'manifest.unreadable',
  scope: 'file',
  from: 'setup',
  means: null,
  statement: 'The manifest is no YAML, or does not follow the schema; every fault is told at once.',
  why: 'Nothing in a manifest that can’t be read is checked: a misspelt key would silently drop the statement behind it.',
  source: { basis: 'definition', citation: 'YAML 1.2 and schemas/manifest.schema.json' },
  clear: 'Correct the manifest at that line; an editor that knows JSON Schema completes its keys.',
  check: (unread) =>
    unread.problems.map(({ field, message, line, column, nearest }) => ({
      record: 'manifest',
      file: unread.path,
      line,
      column,
      subject: field,
      message,
      ...(nearest === undefined ? {} : { clear: `Did you mean \`${nearest}\`?` }),
    })),
});
