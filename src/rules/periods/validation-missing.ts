import { rule } from '../rule.ts';
import { klemes } from '../sources.ts';
import { missingWindow } from './missing-window.ts';

export const periodsValidationMissing = rule({
  id: 'periods.validation-missing',
  scope: 'manifest',
  from: 'validation',
  means: 'incomplete',
  statement: 'No validation window is stated, neither for the study nor for each target.',
  why: 'A score on the days that parameters were fitted to says little about other days; the split-sample test is the least that a simulation model should pass.',
  source: klemes,
  clear: 'State periods.validation as a list of windows that the calibration has not seen.',
  check: (_, { manifest }) => missingWindow(manifest, 'validation'),
});
