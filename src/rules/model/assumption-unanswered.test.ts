import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { modelAssumptionUnanswered } from './assumption-unanswered.ts';

ruleCases(modelAssumptionUnanswered, {
  fires: [
    {
      name: 'does not hold and is not answered',
      remove: ['model.assumptions.1.response'],
      finds: {
        record: 'model',
        field: 'model.assumptions[1]',
        subject: 'The gauge is never drowned.',
        level: 'block',
      },
    },
    {
      name: 'a note in the calibration',
      remove: ['model.assumptions.1.response'],
      phase: 'calibration',
      finds: { level: 'note' },
    },
  ],
  silent: [
    { name: 'holds', set: { 'model.assumptions': [{ states: 'No snow.', holds: true }] } },
    { name: 'none stated', remove: ['model.assumptions'] },
  ],
});
