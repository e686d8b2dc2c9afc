import { rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';

const sources = ['observations', 'inputs', 'parameters', 'structure'] as const;

export const uncertaintySourceUnaddressed = rule({
  id: 'uncertainty.source-unaddressed',
  scope: 'uncertainty',
  from: 'validation',
  means: 'incomplete',
  statement:
    'Observations, inputs, parameters or structure: one source of uncertainty is neither treated nor left out with a reason.',
  why: 'A band that leaves a source out silently is read as the whole uncertainty, and a decision then rests on too narrow a range.',
  source: {
    basis: 'practice',
    citation: 'Common practice: the four usual sources of uncertainty in hydrological modelling.',
  },
  clear: 'Under uncertainty.sources say for each of the four how it was treated, or `left_out_because`.',
  check: ({ id, fragment }) =>
    sources
      .filter((source) => {
        const told = fragment.sources?.[source];
        return !isStated(told?.treated) && !isStated(told?.left_out_because);
      })
      .map((source) => ({
        record: id,
        field: ['uncertainty', 'sources', source],
        subject: source,
        message: `Nothing says how the uncertainty of ${source === 'structure' ? 'the model’s structure' : source} was treated, or why it was left out.`,
      })),
});
