import { rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';

export const setupChoiceUnjustified = rule({
  id: 'setup.choice-unjustified',
  scope: 'setup',
  from: 'validation',
  means: 'incomplete',
  statement: 'A choice of the set-up has no reason.',
  why: 'A default that nobody looked at and a choice made for this catchment look alike afterwards; a reviewer has to know which it was.',
  source: { basis: 'practice', citation: 'Common practice in describing a model’s set-up.' },
  clear: 'Say why in `because`; where the model’s default was taken, say `default: true` and why it suits.',
  check: ({ id, fragment }) =>
    (fragment.choices ?? []).flatMap(({ topic, chosen, because }, index) =>
      isStated(because)
        ? []
        : [
            {
              record: id,
              field: ['setup', 'choices', index],
              subject: topic ?? String(index),
              message: `Nothing says why ${chosen ?? 'this'} was chosen for ${topic ?? 'an unnamed topic'}.`,
            },
          ],
    ),
});
