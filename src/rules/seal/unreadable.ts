import { rule } from '../rule.ts';

export const sealUnreadable = rule({
  id: 'seal.unreadable',
  scope: 'manifest',
  from: 'setup',
  means: null,
  statement:
    'The seals file is broken, holds conflict markers, was edited by hand, or was written by a newer Stoplog.',
  why: 'Seals say who reviewed what. One that can’t be read, or that was changed by hand, proves nothing.',
  source: { basis: 'definition', citation: 'A seal counts only as Stoplog wrote it.' },
  clear:
    'After a merge: `stoplog seal` puts both sides together. Otherwise take the file back from git, or seal the record anew.',
  check: (_, { records, sealsFile }) =>
    sealsFile.faults.map(({ kind, record, line, message }) => ({
      record: record ?? 'manifest',
      file: sealsFile.path,
      line,
      subject: kind,
      message,
      ...(kind === 'newer-scheme'
        ? { clear: 'Install the version of Stoplog that wrote it, or a newer one.' }
        : record === null
          ? {}
          : {
              clear: records.nodes.has(record)
                ? `Take the entry back from git, or look at the record and: stoplog seal ${record}`
                : 'Its record is gone: stoplog seal --all drops it.',
            }),
    })),
});
