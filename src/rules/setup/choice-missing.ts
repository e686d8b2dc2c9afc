import { rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';
import { topics } from './topics.ts';

export const setupChoiceMissing = rule({
  id: 'setup.choice-missing',
  scope: 'setup',
  from: 'calibration',
  means: 'incomplete',
  statement: 'Spatial units, evapotranspiration, runoff generation and routing are not all stated.',
  why: 'These four choices shape the hydrograph as much as the parameters do; without them the model can’t be set up again, not even by its author.',
  source: { basis: 'practice', citation: 'Common practice in describing a model’s set-up.' },
  clear:
    'Add the topic to setup.choices with what was chosen and why; `default: true` where the model’s own default was left.',
  check: ({ id, fragment }) =>
    topics
      .filter(
        ({ words }) =>
          !(fragment.choices ?? []).some(({ topic, chosen }) => words.test(topic ?? '') && isStated(chosen)),
      )
      .map(({ name }) => ({
        record: id,
        field: ['setup', 'choices'],
        subject: name,
        message: `The set-up does not say what was chosen for ${name}.`,
      })),
});
