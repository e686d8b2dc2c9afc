import { rule } from '../rule.ts';

export const parametersMissing = rule({
  id: 'parameters.missing',
  scope: 'parameters',
  from: 'calibration',
  means: 'missing',
  statement: 'The calibrated values are not recorded.',
  why: 'Without the values the run can’t be repeated, and nobody can see what calibration changed.',
  source: {
    basis: 'practice',
    citation: 'Common practice: a calibrated model is its code and its parameter values.',
  },
  clear:
    'List each parameter under parameters.values, or name the table that holds them under parameters.table.',
  check: ({ id, fragment }) =>
    (fragment.values ?? []).length > 0 || fragment.table !== undefined
      ? []
      : [{ record: id, field: ['parameters', 'values'], message: 'No parameter values are recorded.' }],
});
