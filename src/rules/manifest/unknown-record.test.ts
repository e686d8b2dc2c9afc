import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { manifestUnknownRecord } from './unknown-record.ts';

ruleCases(manifestUnknownRecord, {
  fires: [
    {
      name: 'an input',
      set: { 'runs.dry.takes.0': 'inputs.dry-climat' },
      phase: 'setup',
      finds: {
        record: 'runs.dry',
        field: 'runs.dry.takes[0]',
        stated: 'inputs.dry-climat',
        message: 'dry-climate',
        level: 'block',
      },
    },
    {
      name: 'a run',
      set: { 'balance.catchment.run': 'calibrate' },
      finds: { record: 'balance.catchment', message: 'the nearest is `calibrated`' },
    },
    {
      name: 'a target of a band',
      set: { 'uncertainty.bands.upper-flow': { run: 'calibrated' } },
      finds: { record: 'uncertainty' },
    },
    {
      name: 'a comparison',
      set: { 'inputs.rainfall.compare_with': { input: 'chek-gauge' } },
      finds: { record: 'inputs.rainfall', message: 'check-gauge' },
    },
    {
      name: 'a rule in a waiver',
      set: { waivers: [{ rule: 'seal.stael' }] },
      finds: { record: 'manifest', field: 'waivers[0].rule', message: 'the nearest is `seal.stale`' },
    },
    {
      name: 'a rule in a departure',
      set: { departures: [{ rule: 'seal.old', now: 'notes', because: 'x' }] },
      finds: { field: 'departures[0].rule' },
    },
    {
      name: 'a rule in an acceptance',
      set: { 'study.accepts': [{ rule: 'score-low' }] },
      finds: { field: 'study.accepts[0].rule' },
    },
    {
      name: 'a threshold',
      set: { departures: [{ threshold: 'periods.warm_up_day', now: 200, because: 'x' }] },
      finds: { field: 'departures[0].threshold', subject: 'periods.warm_up_day' },
    },
  ],
  silent: [
    {
      name: 'known rules',
      set: {
        departures: [{ rule: 'seal.stale', now: 'warns', because: 'x' }],
        waivers: [{ rule: 'seal.missing' }],
      },
    },
    {
      name: 'every record made with each',
      set: {
        'inputs.gauge': { each: ['g1', 'g2'], files: ['data/{each}.csv'] },
        'runs.dry.takes.0': 'inputs.gauge',
      },
    },
  ],
});
