import { rule } from '../rule.ts';

export const waiverExpired = rule({
  id: 'waiver.expired',
  scope: 'manifest',
  from: 'setup',
  means: null,
  statement: 'The last day of a waiver is past.',
  why: 'A waiver is a promise to mend something by a day. Left to run on, it would become the normal state without anybody’s decision.',
  source: { basis: 'house', citation: 'Our own choice: a permission to pass ends on its day.' },
  clear: 'Mend what it was for and remove it, or have a named person set a new `until` with the reason.',
  check: (_, { manifest, today }) =>
    (manifest.data.waivers ?? []).flatMap(({ rule: waived, record, until }, place) =>
      until === undefined || until >= today
        ? []
        : {
            record: 'manifest',
            field: ['waivers', place, 'until'],
            subject: `${waived} ${record ?? ''}`,
            stated: until,
            message: `The waiver of ${waived}${record === undefined ? '' : ` for ${record}`} ended on ${until}; today is ${today}.`,
          },
    ),
});
