import { rule } from '../rule.ts';
import { fair } from '../sources.ts';

export const studyContactMissing = rule({
  id: 'study.contact-missing',
  scope: 'study',
  from: 'archive',
  means: 'incomplete',
  statement: 'Nobody is named who can be asked about the study and be reached.',
  why: 'Whoever reruns or reviews an archived model will meet a question that the files don’t answer: a rating change, a dry well, a parameter set by hand.',
  source: fair,
  clear: 'Give `study.contacts` a name with an `email`, `orcid` or `url`.',
  check: ({ id, fragment: { contacts = [] } }) =>
    contacts.some(
      ({ name, email, orcid, url }) => name !== undefined && (email ?? orcid ?? url) !== undefined,
    )
      ? []
      : [
          {
            record: id,
            field: ['study', 'contacts'],
            message:
              contacts.length === 0
                ? 'No contact is named.'
                : 'No contact has both a name and a way to be reached (email, ORCID or address of a page).',
          },
        ],
});
