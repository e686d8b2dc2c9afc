import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { runsMissing } from './missing.ts';

ruleCases(runsMissing, {
  fires: [
    {
      name: 'no command',
      remove: ['runs.dry.start'],
      finds: { record: 'runs.dry', field: 'runs.dry', level: 'block', message: 'has no command (`start`).' },
    },
    {
      name: 'no environment, nor the model',
      remove: ['model.environment'],
      finds: [
        { record: 'runs.calibrated', message: 'has no environment' },
        { record: 'runs.dry', message: 'has no environment' },
      ],
    },
    {
      name: 'nothing that it gives',
      remove: ['runs.dry.gives', 'runs.dry.start'],
      finds: { message: 'has no command (`start`), no outputs (`gives`).' },
    },
    {
      name: 'a simulated file that its run does not give',
      set: { 'runs.calibrated.gives': ['runs/calibrated/run.log'] },
      finds: [
        {
          record: 'evaluation.outlet-flow',
          field: 'evaluation.outlet-flow.simulated.file',
          subject: 'runs/calibrated/daily.csv',
          message: 'run calibrated does not say that it gives it',
        },
        { record: 'balance.catchment', field: 'balance.catchment.file' },
      ],
    },
    {
      name: 'another run’s file',
      set: { 'evaluation.outlet-flow.simulated.file': 'runs/dry/daily.csv' },
      finds: { record: 'evaluation.outlet-flow', message: 'run calibrated does not say' },
    },
    {
      name: 'no runs at all',
      remove: ['runs', 'evaluation.outlet-flow.simulated.run', 'balance.catchment.run'],
      finds: [
        { record: 'evaluation.outlet-flow', message: 'no run says that it gives it' },
        { record: 'balance.catchment' },
      ],
    },
  ],
  silent: [
    {
      name: 'an environment of its own',
      remove: ['model.environment'],
      set: {
        'runs.calibrated.environment': { runtime: 'node', version: '>=20' },
        'runs.dry.environment': { runtime: 'node', version: '>=20' },
      },
    },
    {
      name: 'outputs of many gauges, written once',
      set: {
        'runs.gauge': {
          each: ['g1', 'g2'],
          start: ['node', 'model/model.mjs'],
          gives: ['runs/calibrated/*.csv'],
        },
        'evaluation.gauge': {
          each: ['g1', 'g2'],
          variable: 'streamflow',
          simulated: { run: 'gauge.{each}', file: 'runs/calibrated/daily.csv' },
        },
      },
    },
  ],
});
