import { rule } from '../rule.ts';

export const periodsWarmUpMissing = rule({
  id: 'periods.warm-up-missing',
  scope: 'periods',
  from: 'calibration',
  means: 'incomplete',
  statement: 'No warm-up is stated; a warm-up of zero needs its reason.',
  why: 'The stores start from a guess. Until they have forgotten it, flows show the guess and not the catchment, and a score over those days is not the model’s.',
  source: { basis: 'practice', citation: 'Common practice in rainfall-runoff modelling.' },
  clear:
    'State periods.warm_up as first-day/last-day, or as {zero_because: ...} where the run starts from a known state.',
  check: ({ id, fragment }) =>
    fragment.warm_up === undefined
      ? [{ record: id, field: ['periods', 'warm_up'], message: 'No warm-up is stated for the simulation.' }]
      : [],
});
