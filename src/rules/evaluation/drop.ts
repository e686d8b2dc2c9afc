import { figure } from '../figures.ts';
import { rule } from '../rule.ts';
import { scoreOver } from './over.ts';
import { scoreNames } from './score-names.ts';

export const evaluationDrop = rule({
  id: 'evaluation.drop',
  scope: 'evaluation',
  from: 'warn',
  means: null,
  statement: 'The validation scores far below the calibration, in NSE or KGE.',
  why: 'A model that fits the days it was fitted to and no others has learnt their noise, or lacks what the other days are made of.',
  source: { basis: 'house', citation: 'Our own limit; no published one was found.' },
  clear:
    'Look for weather that the calibration did not have, for a changed gauge, and for more parameters than the data bear; say in the review what it is.',
  limits: {
    drop: {
      default: 0.2,
      unit: '1',
      states: 'largest fall of NSE or KGE from calibration to validation',
      looser: 'higher',
    },
  },
  check: ({ id, name, field }, { scores }, limits) => {
    const figures = scores.get(name ?? '');
    const falls = (['nse', 'kge'] as const).flatMap((score) => {
      const before = scoreOver(figures, 'calibration', score);
      const after = scoreOver(figures, 'validation', score);
      if (before === null || after === null || before - after <= (limits.drop ?? 0)) return [];
      return [`${scoreNames[score]} falls from ${figure(before)} to ${figure(after)}`];
    });
    if (falls.length === 0) return [];
    return [
      {
        record: id,
        field: [...field, 'scores'],
        message: `From calibration to validation ${name} loses much: ${falls.join(', ')}.`,
      },
    ];
  },
});
