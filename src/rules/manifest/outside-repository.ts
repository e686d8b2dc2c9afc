import { rule } from '../rule.ts';

export const manifestOutsideRepository = rule({
  id: 'manifest.outside-repository',
  scope: 'manifest',
  from: 'setup',
  means: 'incomplete',
  statement: 'A path leaves the repository, directly or through a symbolic link.',
  why: 'What lies outside is on one machine only and can change unseen; Stoplog reads nothing out there.',
  source: { basis: 'definition', citation: 'A record is about files that the repository holds.' },
  clear:
    'Bring the file into the repository, or describe it with `stored: elsewhere` by its SHA-256, size and place.',
  check: (_, { records }) =>
    records.unmatched
      .filter(({ why }) => why === 'outside-repository')
      .map(({ record, pattern, field }) => ({
        record,
        field,
        subject: pattern,
        stated: pattern,
        message: `\`${pattern}\` leads out of the repository, by itself or over a symbolic link.`,
      })),
});
