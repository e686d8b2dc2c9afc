import { rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';
import { called, declared } from './declared.ts';

export const interventionsUnrepresented = rule({
  id: 'interventions.unrepresented',
  scope: 'interventions',
  from: 'validation',
  means: 'incomplete',
  statement: 'An intervention is not represented in the model and nothing says why that is tolerable.',
  why: 'What the model leaves out ends up in its parameters; whether that matters depends on its share of the flow in question.',
  source: { basis: 'practice', citation: 'Common practice in describing a catchment.' },
  clear:
    'Say `represented: true` and how, or `represented: false` and because, best with its share of the flow that the purpose is about.',
  check: ({ id, fragment }) =>
    declared(fragment).flatMap((intervention, index) => {
      const { represented, because, how } = intervention;
      const told = represented === true ? isStated(how) : represented === false && isStated(because);
      if (told) return [];
      return [
        {
          record: id,
          field: ['interventions', index],
          subject: called(intervention),
          message:
            represented === true
              ? `Nothing says how the ${called(intervention)} is represented.`
              : `The ${called(intervention)} is not represented in the model, and nothing says why that is tolerable.`,
        },
      ];
    }),
});
