import { rule } from '../rule.ts';
import { fair } from '../sources.ts';

export const inputsRetrievedMissing = rule({
  id: 'inputs.retrieved-missing',
  scope: 'inputs',
  from: 'validation',
  means: 'incomplete',
  statement: 'The day on which the data were obtained is missing or lies in the future.',
  why: 'Gauging offices revise flows and infill rain for years. The day of retrieval tells which state of their archive the model saw.',
  source: fair,
  clear: 'Write `source.retrieved` as a date, such as 2026-01-14.',
  check({ id, field, fragment: { source } }, { today }) {
    const at = { record: id, field: [...field, 'source', 'retrieved'] };
    const retrieved = source?.retrieved;
    if (retrieved === undefined)
      return [{ ...at, message: 'Nothing says on which day these data were obtained.' }];
    if (retrieved <= today) return [];
    return [
      {
        ...at,
        stated: retrieved,
        message: `These data are said to be obtained on ${retrieved}, which is after today, ${today}.`,
      },
    ];
  },
});
