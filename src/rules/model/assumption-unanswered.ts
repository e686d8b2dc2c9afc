import { rule } from '../rule.ts';

export const modelAssumptionUnanswered = rule({
  id: 'model.assumption-unanswered',
  scope: 'model',
  from: 'validation',
  means: 'incomplete',
  statement: 'An assumption of the model is said not to hold, and nothing says what was done about it.',
  why: 'Backwater at the gauge, groundwater leaving under the divide or a frozen soil break the equations where they matter most. The results stand only if something answers for it.',
  source: {
    basis: 'practice',
    citation: 'Common practice: a violated assumption is treated or its effect is bounded.',
  },
  clear: 'Write a `response` to the assumption: what was removed, corrected or bounded.',
  check: ({ id, fragment: { assumptions = [] } }) =>
    assumptions.flatMap(({ states = '', holds, response }, place) =>
      holds !== false || response !== undefined
        ? []
        : {
            record: id,
            field: ['model', 'assumptions', place],
            subject: states,
            message: `“${states}” is said not to hold in this catchment, and nothing says what was done about it.`,
          },
    ),
});
