import type { SeriesProblem } from '../../series/table.ts';
import { tellProblem } from '../../series/tell.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { isAmount, undeclaredCode } from './undeclared-code.ts';

export const inputsUnreadableRow = rule({
  id: 'inputs.unreadable-row',
  scope: 'inputs',
  from: 'setup',
  means: 'contradicted',
  statement:
    'A row of a series can’t be read as the record says the files are laid out: text for a number, another count of columns, a date that is none.',
  why: 'A row that is passed over is a day without rain or flow, and nobody notices; a decimal comma or a shifted column reads as another number altogether.',
  source: { basis: 'definition', citation: 'Follows from the words: `series` says how each row is written.' },
  clear: 'Mend the rows, or correct `series` (separator, decimal, skip_lines, time, values, missing).',
  check: ({ id, name, field, fragment: { role } }, { profiles }) =>
    (profiles.get(name ?? '')?.files ?? []).flatMap(({ path, problems }): readonly Draft[] => {
      const isOurs = (problem: SeriesProblem) => !isAmount(role) || undeclaredCode(problem) === null;
      const [first, ...others] = problems.first.filter(isOurs);
      if (first === undefined) return [];
      const { line } = first;
      const more = problems.total - (problems.first.length - others.length);
      return [
        {
          record: id,
          subject: path,
          ...(line === null ? { field: [...field, 'series'] } : { file: path, line }),
          found: first.found,
          message: `${tellProblem(path, first)}.${more > 0 ? ` ${figure(more)} more can’t be read.` : ''}`,
          detail: others.slice(0, shown - 1).map((problem) => tellProblem(path, problem)),
        },
      ];
    }),
});

/** Problems that are told of one file. */
const shown = 4;
