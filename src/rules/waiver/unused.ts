import { rule } from '../rule.ts';
import { isMeantFor } from '../waived.ts';

export const waiverUnused = rule({
  id: 'waiver.unused',
  scope: 'manifest',
  from: 'warn',
  means: null,
  second: true,
  statement: 'A waiver matches no finding.',
  why: 'What it was for is mended, or the waiver names another record than its writer meant. Kept, it would let a later fault pass unseen.',
  source: { basis: 'definition', citation: 'A waiver is for a finding that there is.' },
  clear: 'Remove the waiver, or correct the rule, record or subject that it names.',
  check: (_, { manifest, found, known, today }) =>
    (manifest.data.waivers ?? []).flatMap((waiver, place) =>
      found.some((one) => isMeantFor(waiver, one)) ||
      (waiver.until ?? today) < today ||
      !known.rules.has(waiver.rule)
        ? []
        : {
            record: 'manifest',
            field: ['waivers', place],
            subject: `${waiver.rule} ${waiver.record ?? ''} ${waiver.subject ?? ''}`,
            message: `The waiver of ${waiver.rule}${waiver.record === undefined ? '' : ` for ${waiver.record}`} matches nothing that was found.`,
          },
    ),
});
