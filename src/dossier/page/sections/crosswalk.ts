import { crosswalksOf } from '../../machine/crosswalk.ts';
import { type Block, heading, paragraph, type Text, tableOr } from '../document.ts';
import type { Subject } from '../subject.ts';

/** Where the records answer the elements of published documentation frameworks. */
export function crosswalkSection(subject: Subject): readonly Block[] {
  return [
    heading(1, 'Crosswalk to documentation frameworks', `${subject.key}-crosswalk`),
    ...crosswalksOf(subject).flatMap(({ name, source, note, elements }, place) => [
      heading(2, name, `${subject.key}-framework-${place + 1}`),
      paragraph(`${source}.${note === undefined ? '' : ` ${note}`}`),
      tableOr(
        'It has no elements.',
        `Records that answer ${name}`,
        ['Element', 'Title', 'Answered by'],
        elements.map(({ id, title, answers }): readonly Text[] => [
          id,
          title,
          answers.length === 0
            ? 'no record answers it'
            : answers.flatMap(({ record, fields, state }, at) => [
                at === 0 ? '' : '; ',
                { code: record },
                ` ${fields.length === 0 ? '' : `(${fields.join(', ')}) `}${state}`,
              ]),
        ]),
      ),
    ]),
  ];
}
