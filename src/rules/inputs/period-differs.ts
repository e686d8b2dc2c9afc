import type { InputProfile, ProfiledFile } from '../../facts/profiles.ts';
import { parsePeriod } from '../../manifest/period.ts';
import { formatDate, parseDate, secondsOfDay, type Window } from '../../series/calendar.ts';
import { figure } from '../figures.ts';
import { rule } from '../rule.ts';

export const inputsPeriodDiffers = rule({
  id: 'inputs.period-differs',
  scope: 'inputs',
  from: 'calibration',
  means: 'contradicted',
  statement:
    'The stated period is not what the files hold. Samples may begin later and end earlier by their longest pause.',
  why: 'Windows are held against the stated period; days that the files do not have can’t force a model or be scored.',
  source: { basis: 'definition', citation: 'Follows from the words: the period is what the files cover.' },
  clear: 'Write the period that the files hold, or add the files that are lacking.',
  check: ({ id, name, field, fragment: { period, combine } }, { profiles }) => {
    const stated = parsePeriod(period ?? '');
    const profile = profiles.get(name ?? '');
    if (stated === null || profile === undefined || !isReadable(profile)) return [];
    const { files, days } = profile;
    const about = { record: id, field: [...field, 'period'], stated: `${stated.first}/${stated.last}` };
    if (days === null)
      return [
        {
          ...about,
          message: 'No day is in all of the files, so what they make together has no value at all.',
        },
      ];
    const firstDay = parseDate(stated.first) ?? 0;
    const lastDay = parseDate(stated.last) ?? 0;
    const pause = profile.step?.kind === 'irregular' ? longestPause(files) : 0;
    const late = days.firstDay - firstDay;
    const early = lastDay - days.lastDay;
    if (late >= 0 && late <= pause && early >= 0 && early <= pause) return [];
    const together = combine !== undefined && combine !== 'each' && files.length > 1;
    return [
      {
        ...about,
        found: written(days),
        message: `The files hold ${written(days)}${together ? ' together' : ''}, not ${about.stated}: ${[
          side(late, pause, 'begin', 'later', 'earlier'),
          side(early, pause, 'end', 'earlier', 'later'),
        ]
          .flat()
          .join(' and ')}.`,
        detail: together
          ? files.flatMap(({ path, days: own }) => (own === null ? [] : [`${path}: ${written(own)}`]))
          : [],
      },
    ];
  },
});

/** Where rows can't be read or files are not here, nobody knows what the files hold. */
function isReadable({ files, isComplete }: InputProfile): boolean {
  return isComplete && files.every(({ problems }) => problems.total === 0);
}

function longestPause(files: readonly ProfiledFile[]): number {
  return Math.ceil(Math.max(...files.map(({ longestSeconds }) => longestSeconds)) / secondsOfDay);
}

function side(days: number, pause: number, verb: string, inside: string, outside: string): readonly string[] {
  if (days >= 0 && days <= pause) return [];
  const count = Math.abs(days);
  return [`they ${verb} ${figure(count)} ${count === 1 ? 'day' : 'days'} ${days > 0 ? inside : outside}`];
}

function written({ firstDay, lastDay }: Window): string {
  return `${formatDate(firstDay)}/${formatDate(lastDay)}`;
}
