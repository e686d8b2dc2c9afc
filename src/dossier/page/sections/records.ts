import { restsOnPicture } from '../../charts/rests-on.ts';
import { type Block, figures, heading, paragraph, tableOr } from '../document.ts';
import type { Subject } from '../subject.ts';
import { restingRows } from './resting-rows.ts';

const grades =
  'Grades, weakest first: stated (nobody has sealed it), sealed (a named person looked at it), recomputed (Stoplog computed the stated figures from the files), rerun (the model was run again and gave the same outputs).';

/** State and grade of every record, who sealed it when, and what rests on what. */
export function recordsSection(subject: Subject): readonly Block[] {
  const { verdict, facts, key } = subject;
  const reasons = [...facts.standings.values()].flatMap(({ record, seal }) =>
    seal?.because == null
      ? []
      : [
          [
            { code: record },
            ` was sealed though its results had not moved: ${seal.because} (${seal.sealed_by}, ${seal.sealed_on})`,
          ],
        ],
  );
  return [
    heading(1, 'Records', `${key}-records`),
    paragraph(grades),
    tableOr(
      'The manifest holds no records.',
      'State and grade of every record',
      ['Record', 'State', 'Grade', 'Sealed by', 'Sealed on'],
      verdict.records.map(({ id, state, grade, sealed_by, sealed_on }) => [
        { code: id },
        state === 'sound' ? state : { strong: state },
        grade ?? '-',
        sealed_by ?? 'nobody',
        sealed_on ?? '-',
      ]),
    ),
    ...(reasons.length === 0 ? [] : [{ kind: 'list' as const, items: reasons }]),
    heading(2, 'What rests on what', `${key}-rests-on`),
    ...figures(picture(subject)),
  ];
}

function picture({ facts, verdict, content }: Subject) {
  const { rows, edges } = restingRows(facts, verdict);
  return restsOnPicture(rows, edges, {
    title: 'What rests on what',
    source: `records of ${facts.manifest.path} at ${content.commit.slice(0, 7)}; what already follows from a longer way is not drawn`,
  });
}
