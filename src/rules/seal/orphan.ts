import { rule } from '../rule.ts';

export const sealOrphan = rule({
  id: 'seal.orphan',
  scope: 'manifest',
  from: 'warn',
  means: null,
  statement: 'A seal is there whose record is gone.',
  why: 'The record was removed or renamed. Its seal speaks for nothing, and if the name is used again it would be held against other content.',
  source: { basis: 'definition', citation: 'A seal belongs to a record.' },
  clear: 'Renamed: stoplog seal --moved. Removed on purpose: stoplog seal --all drops it.',
  check: (_, { records, sealsFile }) =>
    [...sealsFile.seals].flatMap(([id, seal]) =>
      records.nodes.has(id)
        ? []
        : {
            record: 'manifest',
            file: sealsFile.path,
            subject: id,
            message: `${id} was sealed on ${seal.sealed_on} by ${seal.sealed_by}, but the manifest has no such record any more.`,
          },
    ),
});
