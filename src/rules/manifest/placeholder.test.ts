import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { manifestPlaceholder } from './placeholder.ts';

ruleCases(manifestPlaceholder, {
  fires: [
    {
      name: 'a release to be filled in',
      set: { 'model.release': 'tbd' },
      phase: 'setup',
      finds: { record: 'model', field: 'model.release', stated: 'tbd', level: 'block' },
    },
    {
      name: 'an empty purpose',
      set: { 'study.purpose': ' ' },
      phase: 'setup',
      finds: { record: 'study', message: '`study.purpose` is empty', level: 'note' },
    },
    {
      name: 'a provider',
      set: { 'inputs.rainfall.source.provider': 'unknown' },
      phase: 'calibration',
      finds: { record: 'inputs.rainfall', field: 'inputs.rainfall.source.provider', level: 'block' },
    },
    {
      name: 'in a list',
      set: { 'setup.choices.1.because': 'as usual' },
      finds: { record: 'setup', field: 'setup.choices[1].because' },
    },
    {
      name: 'a scenario’s question',
      set: { 'scenarios.cases.dry.asks': '?' },
      finds: { record: 'scenarios.dry' },
    },
    {
      name: 'a season, which belongs to no record of its own',
      set: {
        'inputs.rainfall.gaps_treated': 'n/a',
        'runs.dry.environment': { runtime: 'node', version: 'xxx' },
      },
      finds: [{ record: 'inputs.rainfall' }, { record: 'runs.dry' }],
    },
  ],
  silent: [
    {
      name: 'codes, columns and words of a command',
      set: {
        'inputs.rainfall.series.missing': ['-', 'NA', '?'],
        'inputs.rainfall.series.time': 'xxx',
        'runs.dry.start': ['model', '-'],
      },
    },
    {
      name: 'signatures, at which waiver.unsigned looks',
      set: { 'study.accepts': [{ rule: 'seal.stale', by: '?' }] },
    },
  ],
});
