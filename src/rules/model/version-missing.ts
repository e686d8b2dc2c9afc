import { rule } from '../rule.ts';

export const modelVersionMissing = rule({
  id: 'model.version-missing',
  scope: 'model',
  from: 'setup',
  means: 'incomplete',
  statement: 'The model’s version is not stated.',
  why: 'Process equations, defaults and file formats change between versions; a parameter set belongs to the version that it was calibrated with.',
  source: { basis: 'practice', citation: 'Common practice: results are reported with the model’s version.' },
  clear: 'Write `model.version`, in quotes: version: "1.4".',
  check: ({ id, present, fragment }) =>
    fragment.version !== undefined
      ? []
      : [
          {
            record: id,
            field: ['model', 'version'],
            message: present
              ? 'Nothing says which version of the model this study uses.'
              : 'Nothing says which model this study uses: there is no `model` section.',
          },
        ],
});
