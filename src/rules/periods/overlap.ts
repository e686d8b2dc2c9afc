import { windowSets } from '../../facts/windows.ts';
import { dateOfDay, dayNumber, type Period } from '../../manifest/period.ts';
import { rule } from '../rule.ts';
import { klemes } from '../sources.ts';

export const periodsOverlap = rule({
  id: 'periods.overlap',
  scope: 'manifest',
  from: 'calibration',
  means: 'contradicted',
  statement: 'Warm-up, calibration and validation of one target share days.',
  why: 'A day that parameters were fitted to can’t test them, and a warm-up day still shows the guessed first content of the stores.',
  source: klemes,
  clear: 'Move the windows apart; the first and last day of each belong to it.',
  check: (_, { records }) =>
    windowSets(records).flatMap(({ record, windows }) =>
      windows.flatMap((one, index) =>
        windows.slice(index + 1).flatMap((other) => {
          const shared = sharedDays(one.period, other.period);
          const inherited =
            record !== 'periods' && one.field[0] === 'periods' && other.field[0] === 'periods';
          if (shared === null || inherited) return [];
          const days =
            shared.days === 1 ? `${shared.first}` : `${shared.days} days, ${shared.first} to ${shared.last}`;
          return {
            record,
            field: other.field[0] === 'periods' && record !== 'periods' ? one.field : other.field,
            subject: `${one.kind} and ${other.kind}`,
            found: shared.days,
            unit: 'd',
            message:
              one.kind === other.kind
                ? `Two ${one.kind} windows share ${days}, so these days count twice.`
                : `The ${one.kind} and the ${other.kind} share ${days}.`,
          };
        }),
      ),
    ),
});

function sharedDays(one: Period, other: Period): Period | null {
  const first = Math.max(dayNumber(one.first), dayNumber(other.first));
  const last = Math.min(dayNumber(one.last), dayNumber(other.last));
  return first > last ? null : { first: dateOfDay(first), last: dateOfDay(last), days: last - first + 1 };
}
