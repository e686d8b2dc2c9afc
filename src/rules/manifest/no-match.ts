import { rule } from '../rule.ts';

export const manifestNoMatch = rule({
  id: 'manifest.no-match',
  scope: 'manifest',
  from: 'setup',
  means: 'incomplete',
  statement: 'A path or pattern names no file that git tracks.',
  why: 'A record that points at nothing can’t be checked, and a clone of the repository would lack the file.',
  source: { basis: 'definition', citation: 'A record is about files that the repository holds.' },
  clear: 'Correct the path, or add the file to git; for data kept outside git write `stored: elsewhere`.',
  check: (_, { records }) =>
    records.unmatched
      .filter(({ why, field }) => why === 'no-match' && field[0] !== 'readings')
      .map(({ record, pattern, field, untracked }) => ({
        record,
        field,
        subject: pattern,
        stated: pattern,
        message:
          untracked.length === 0
            ? `\`${pattern}\` names no file that git tracks.`
            : `\`${pattern}\` names ${untracked.slice(0, 3).join(', ')}${untracked.length > 3 ? ` and ${untracked.length - 3} more` : ''} on disk, which git does not track: a clone would not have it.`,
        ...(untracked.length === 0 ? {} : { clear: `git add ${untracked.slice(0, 3).join(' ')}` }),
        ...(field[0] === 'runs' && field[2] === 'gives' ? { from: 'calibration' as const } : {}),
      })),
});
