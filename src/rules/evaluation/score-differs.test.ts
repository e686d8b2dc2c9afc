import { expect } from 'vitest';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { evaluationScoreDiffers } from './score-differs.ts';

const target = 'evaluation.outlet-flow';
const calibration = `${target}.scores.calibration`;
const pointer = `version https://git-lfs.github.com/spec/v1\noid sha256:${'0'.repeat(64)}\nsize 9\n`;
const table = { [`${target}.scores`]: { table: 'runs/scores.csv' } };

ruleCases(evaluationScoreDiffers, {
  fires: [
    {
      name: 'one wrong digit',
      set: { [`${calibration}.nse`]: 0.956 },
      finds: {
        record: target,
        field: `${calibration}.nse`,
        subject: 'calibration nse',
        stated: 0.956,
        // By plain formulas in tests/facts/scores.test.ts: 0.9655656.
        found: 0.96557,
        level: 'block',
        message: /NSE of outlet-flow over calibration is stated as 0\.956; the files give 0\.96557\.$/,
        detail: ['recomputed over 2003-10-01/2007-09-30: 1 459 of 1 461 steps paired'],
      },
    },
    {
      name: 'PBIAS with the other sign',
      set: { [`${calibration}.pbias`]: -7.77 },
      finds: {
        unit: '%',
        found: 7.7656,
        message: 'The stated figure is the recomputed figure with its sign reversed.',
      },
    },
    {
      name: 'R2 given as NSE',
      set: { [`${calibration}.nse`]: 0.995 },
      finds: { message: 'The stated figure is the R2 of the same pairs.' },
    },
    {
      name: 'windows swapped',
      set: {
        [calibration]: { nse: 0.967, log_nse: 0.965, pbias: 7.9 },
        [`${target}.scores.validation`]: { nse: 0.966, log_nse: 0.964, pbias: 7.77 },
      },
      finds: [
        {
          field: calibration,
          subject: 'calibration',
          message:
            'The NSE, log-NSE, PBIAS of outlet-flow over calibration are not what the files give. Each stated figure is the figure of the validation window.',
          // By plain formulas in tests/facts/scores.test.ts: 0.9655656 and 7.7656.
          detail: [
            'NSE: stated 0.967, found 0.96557',
            expect.stringMatching(/^log-NSE: stated 0\.965, found 0\.96\d{3}$/),
            'PBIAS: stated 7.9, found 7.766',
            'recomputed over 2003-10-01/2007-09-30: 1 459 of 1 461 steps paired',
          ],
        },
        { subject: 'validation', message: 'the figure of the calibration window.' },
      ],
    },
    {
      name: 'every score of a window, and no known cause',
      set: { [calibration]: { nse: 0.5, pbias: 30, r2: 0.4 } },
      finds: {
        subject: 'calibration',
        level: 'block',
        message: /^The NSE, PBIAS, R2 of .* another run, column or window that was scored\.$/,
      },
    },
    {
      name: 'two wrong digits beside a score that agrees',
      set: { [calibration]: { nse: 0.5, pbias: 30, r2: 0.995 } },
      finds: [{ subject: 'calibration nse' }, { subject: 'calibration pbias' }],
    },
    {
      name: 'an error in the series’ own unit',
      set: { [`${calibration}.rmse`]: 0.2 },
      finds: { field: `${calibration}.rmse`, unit: 'm3/s' },
    },
    {
      name: 'a share of peaks that nothing defines',
      set: { [`${calibration}.peaks_hit`]: 0.9 },
      finds: {
        subject: 'calibration peaks_hit',
        message: 'can’t be recomputed: nothing says what counts as a peak',
      },
    },
    {
      name: 'a window that is not stated',
      remove: ['periods.validation', `${target}.scores.validation.kge`, `${target}.scores.validation.r2`],
      finds: {
        field: `${target}.scores.validation`,
        subject: 'validation',
        message:
          'The NSE, log-NSE, PBIAS of outlet-flow over validation can’t be recomputed: no validation window is stated.',
      },
    },
    {
      name: 'series that can’t be compared',
      set: { [`${target}.simulated.values`]: 'runoff' },
      finds: {
        field: `${target}.simulated`,
        level: 'block',
        message: /The scores of outlet-flow can’t be recomputed: .*a column named "runoff"/,
      },
    },
    {
      name: 'content that is not here',
      files: { 'runs/calibrated/daily.csv': pointer },
      finds: {
        level: 'warn',
        message: 'the content of runs/calibrated/daily.csv is not here',
        clear: 'Fetch',
      },
    },
    {
      name: 'an output that git does not hold',
      set: { [`${target}.simulated.file`]: 'runs/calibrated/hourly.csv' },
      finds: {
        level: 'warn',
        message: /can’t be recomputed: git holds no file runs\/calibrated\/hourly\.csv\.$/,
        clear: /^Correct the path, or add the file to git/,
      },
    },
    {
      name: 'an input that is kept outside git',
      set: {
        'inputs.streamflow.stored': 'elsewhere',
        'inputs.streamflow.files': [{ path: 'archive/flow.csv', sha256: 'a'.repeat(64) }],
      },
      finds: {
        level: 'warn',
        message: 'can’t be recomputed: the files of inputs.streamflow are kept outside git.',
        clear: 'add the file to git',
      },
    },
    {
      name: 'an output that is a link to nothing',
      files: { 'runs/calibrated/daily.csv': { link: 'gone.csv' } },
      finds: { level: 'warn', message: 'is a link that leads to no file', clear: 'in place of the link' },
    },
    {
      name: 'content that is not here when archived',
      files: { 'data/flow.csv': pointer },
      phase: 'archive',
      finds: { level: 'block' },
    },
    {
      name: 'in a table',
      set: table,
      files: {
        'runs/scores.csv':
          'window,score,value\ncalibration,nse,0.966\ncalibration,pbias,-7.77\nall,nse,0.9\n',
      },
      finds: [
        {
          file: 'runs/scores.csv',
          line: 4,
          message: 'expected a window, calibration or validation, received "all"',
        },
        { file: 'runs/scores.csv', line: 3, stated: -7.77, message: 'sign reversed' },
      ],
    },
    {
      name: 'only noted in set-up',
      set: { [`${calibration}.nse`]: 0.956 },
      phase: 'setup',
      finds: { level: 'note' },
    },
  ],
  silent: [
    { name: 'fewer decimals', set: { [`${calibration}.nse`]: 0.97, [`${calibration}.pbias`]: 8 } },
    {
      name: 'no scores, which is another rule’s',
      remove: [`${target}.scores`],
      set: { [`${target}.simulated.values`]: 'runoff' },
    },
    {
      name: 'a variable that can’t be evaluated',
      set: { 'evaluation.soil': { variable: 'soil_water', none_because: 'no probes' } },
    },
    {
      name: 'a table that agrees',
      set: table,
      files: { 'runs/scores.csv': 'window,score,value\ncalibration,nse,0.966\nvalidation,pbias,7.90\n' },
    },
  ],
});
