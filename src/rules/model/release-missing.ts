import { rule } from '../rule.ts';

export const modelReleaseMissing = rule({
  id: 'model.release-missing',
  scope: 'model',
  from: 'setup',
  means: 'incomplete',
  statement: 'The exact release or revision number of the model is not stated.',
  why: 'Corrections between releases of one version move flows and balances. Only the release number tells which of them ran.',
  source: {
    basis: 'practice',
    citation: 'Common practice: results are reported with the model’s release or revision number.',
  },
  clear: 'Write `model.release` as the model prints it or its archive names it, in quotes: release: "1.4.2".',
  check: ({ id, fragment }) =>
    fragment.release !== undefined
      ? []
      : [
          {
            record: id,
            field: ['model', 'release'],
            message: 'Nothing says which release or revision of the model ran.',
          },
        ],
});
