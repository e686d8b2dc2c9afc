import { rule } from '../rule.ts';
import { ep621 } from '../sources.ts';

export const modelJustificationMissing = rule({
  id: 'model.justification-missing',
  scope: 'model',
  from: 'validation',
  means: 'incomplete',
  statement: 'Nothing says why this model suits the purpose, or no other model was weighed.',
  why: 'A model is chosen for what it can represent: snow, a falling water table, tile drains. A reader must see that the choice followed the question and not habit.',
  source: ep621,
  clear:
    'Write `model.justification`, and in `model.alternatives` at least one model with `name` and `rejected_because`.',
  check({ id, fragment: { justification, alternatives = [] } }) {
    const weighed = alternatives.some(
      ({ name, rejected_because }) => name !== undefined && rejected_because !== undefined,
    );
    return [
      ...(justification === undefined
        ? [
            {
              record: id,
              field: ['model', 'justification'],
              subject: 'justification',
              message: 'Nothing says why this model suits the purpose.',
            },
          ]
        : []),
      ...(weighed
        ? []
        : [
            {
              record: id,
              field: ['model', 'alternatives'],
              subject: 'alternatives',
              message: 'No other model is named with the reason why it was not taken.',
            },
          ]),
    ];
  },
});
