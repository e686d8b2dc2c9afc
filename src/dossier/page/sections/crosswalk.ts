import { few } from '../../../rules/figures.ts';
import { type Answer, crosswalksOf } from '../../machine/crosswalk.ts';
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
        ['Element', 'Title', 'Answered by', 'State'],
        elements.flatMap(({ id, title, answers }) => rowsOf(id, title, answers)),
      ),
    ]),
  ];
}

/** Records of one area that answer by the same fields and are in the same state are one row; the element is told once. */
function rowsOf(id: string, title: string, answers: readonly Answer[]): readonly (readonly Text[])[] {
  const alike = new Map<string, Answer[]>();
  for (const answer of answers) {
    const key = [answer.record.split('.')[0], ...answer.fields, answer.state].join(' ');
    alike.set(key, [...(alike.get(key) ?? []), answer]);
  }
  const groups = [...alike.values()];
  if (groups.length === 0) return [[id, title, 'no record answers it', '-']];
  return groups.map((group) => {
    const [first] = group;
    const fields = first?.fields ?? [];
    const records = few(
      group.map(({ record }) => record),
      4,
    );
    const state = first?.state ?? '';
    return [
      id,
      title,
      [{ code: records }, fields.length === 0 ? '' : `: ${fields.join(', ')}`],
      state === 'sound' ? state : { strong: state },
    ];
  });
}
