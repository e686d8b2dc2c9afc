import { gitPath } from '../../records/paths.ts';
import type { Unmatched } from '../../records/record.ts';
import { few } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';

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
      .map(({ record, pattern, field, ...onDisk }) => ({
        record,
        field,
        subject: pattern,
        stated: pattern,
        ...told(pattern, onDisk),
        ...(field[0] === 'runs' && field[2] === 'gives' ? { from: 'calibration' as const } : {}),
      })),
});

function told(
  pattern: string,
  { untracked, ignored }: Pick<Unmatched, 'untracked' | 'ignored'>,
): Pick<Draft, 'message' | 'clear'> {
  if (untracked.length > 0)
    return {
      message: `\`${pattern}\` names ${few(untracked)} on disk, which git does not track: a clone would not have it.`,
      clear: `git add ${untracked.slice(0, 3).map(gitPath).join(' ')}`,
    };
  if (ignored.length > 0)
    return {
      message: `\`${pattern}\` names ${few(ignored)} on disk, which git is told to ignore: a clone would not have it.`,
      clear:
        'Take it out of .gitignore and add it; or, for files kept outside git, write `stored: elsewhere` with SHA-256, size and location.',
    };
  return { message: `\`${pattern}\` names no file that git tracks.` };
}
