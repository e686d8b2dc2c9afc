import { rule } from '../rule.ts';
import { klemes } from '../sources.ts';
import { missingWindow } from './missing-window.ts';

export const periodsCalibrationMissing = rule({
  id: 'periods.calibration-missing',
  scope: 'manifest',
  from: 'calibration',
  means: 'incomplete',
  statement: 'No calibration window is stated, neither for the study nor for each target.',
  why: 'Without the days on which parameters were fitted nobody can tell a fit from a test, nor see which weather the parameters have known.',
  source: klemes,
  clear: 'State periods.calibration as a list of windows, such as [2003-10-01/2009-09-30].',
  check: (_, { manifest }) => missingWindow(manifest, 'calibration'),
});
