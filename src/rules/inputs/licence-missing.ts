import { rule } from '../rule.ts';
import { fair } from '../sources.ts';

export const inputsLicenceMissing = rule({
  id: 'inputs.licence-missing',
  scope: 'inputs',
  from: 'archive',
  means: 'incomplete',
  statement: 'The licence of the data is not stated.',
  why: 'An archive can’t hand on rain or flow data that it may not copy; then the run can’t be repeated from the package.',
  source: fair,
  clear: 'Write `source.licence`: an SPDX id such as CC-BY-4.0, or the licence’s name.',
  check: ({ id, field, fragment: { source } }) =>
    source?.licence !== undefined
      ? []
      : [
          {
            record: id,
            field: [...field, 'source', 'licence'],
            message: 'Nothing says under which licence these data may be used and handed on.',
          },
        ],
});
