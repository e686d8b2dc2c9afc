import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { evaluationMissing } from './missing.ts';

const target = 'evaluation.outlet-flow';

ruleCases(evaluationMissing, {
  fires: [
    {
      name: 'a variable that the purpose needs',
      set: { 'study.needs': [{ variable: 'streamflow' }, { variable: 'soil_water' }] },
      finds: {
        record: 'evaluation',
        field: 'evaluation',
        subject: 'soil_water',
        level: 'block',
        message: 'needs soil water, but no target',
      },
    },
    {
      name: 'a target that does not say which variable it compares',
      remove: [`${target}.variable`],
      finds: { record: 'evaluation', subject: 'streamflow', clear: 'write `variable: streamflow` there' },
    },
    {
      name: 'nothing is evaluated, and no need is stated',
      remove: ['evaluation', 'study.needs'],
      finds: { record: 'evaluation', message: 'Nothing that the model simulates' },
    },
    {
      name: 'no scores of the validation',
      remove: [`${target}.scores.validation`],
      finds: { record: target, field: `${target}.scores`, subject: 'validation', level: 'block' },
    },
    {
      name: 'no scores while calibrating: those of the validation are only noted',
      remove: [`${target}.scores`],
      phase: 'calibration',
      finds: [
        { subject: 'calibration', level: 'block' },
        { subject: 'validation', level: 'note' },
      ],
    },
    {
      name: 'a table without the validation',
      set: { [`${target}.scores`]: { table: 'runs/scores.csv' } },
      files: { 'runs/scores.csv': 'window,score,value\ncalibration,nse,0.966\n' },
      finds: { subject: 'validation' },
    },
    {
      name: 'a reason that says nothing',
      set: { 'evaluation.soil': { variable: 'soil_water', none_because: 'todo' } },
      finds: [{ record: 'evaluation.soil' }, { record: 'evaluation.soil' }],
    },
  ],
  silent: [
    {
      name: 'a variable that can’t be evaluated',
      set: {
        'study.needs': [{ variable: 'streamflow' }, { variable: 'soil_water' }],
        'evaluation.soil': { variable: 'soil_water', none_because: 'no probes in the catchment' },
      },
    },
    {
      name: 'a table of both windows',
      set: { [`${target}.scores`]: { table: 'runs/scores.csv' } },
      files: { 'runs/scores.csv': 'window,score,value\ncalibration,nse,0.966\nvalidation,nse,0.967\n' },
    },
  ],
});
