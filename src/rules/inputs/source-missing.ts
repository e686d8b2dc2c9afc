import { rule } from '../rule.ts';
import { fair } from '../sources.ts';

export const inputsSourceMissing = rule({
  id: 'inputs.source-missing',
  scope: 'inputs',
  from: 'setup',
  means: 'incomplete',
  statement: 'Provider, title, or all of address, DOI and “collected by” are missing.',
  why: 'Data whose origin is not known can’t be checked for gauge moves, rating changes or later corrections, and nobody can fetch them again.',
  source: fair,
  clear: 'Fill the input’s `source`: `provider`, `title`, and one of `url`, `doi`, `collected_by`.',
  check({ id, field, fragment: { source = {} } }) {
    const lacking = [
      source.provider === undefined ? 'who gives the data out (`provider`)' : '',
      source.title === undefined ? 'what the data set is called (`title`)' : '',
      (source.url ?? source.doi ?? source.collected_by) === undefined
        ? 'where or how they were obtained (`url`, `doi` or `collected_by`)'
        : '',
    ].filter((one) => one !== '');
    if (lacking.length === 0) return [];
    return [
      {
        record: id,
        field: [...field, 'source'],
        message: `The source of these data does not say ${lacking.join(', nor ')}.`,
      },
    ];
  },
});
