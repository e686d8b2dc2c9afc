import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { manifestLoosened } from './loosened.ts';

const waiver = { rule: 'inputs.unverified', record: 'inputs.rainfall', until: '2021-06-30' };

ruleCases(manifestLoosened, {
  fires: [
    {
      name: 'the phase',
      before: { set: { 'study.phase': 'archive' } },
      finds: {
        record: 'manifest',
        field: 'study.phase',
        message: 'phase `archive` to `application`',
        level: 'warn',
      },
    },
    {
      name: 'a level',
      before: {},
      set: { departures: [{ rule: 'seal.stale', now: 'warns', because: 'x' }] },
      finds: { field: 'departures[0]', subject: 'seal.stale', message: 'blocks from calibration, now warns' },
    },
    {
      name: 'a level that was raised',
      before: { set: { departures: [{ rule: 'seal.reworded', now: 'blocks', because: 'x' }] } },
      finds: { field: 'departures', message: 'blocks, now warns' },
    },
    {
      name: 'a threshold',
      before: {},
      set: { departures: [{ threshold: 'periods.warm_up_days', now: 200, because: 'x' }] },
      finds: { message: 'periods.warm_up_days less strict: 365, now 200' },
    },
    {
      name: 'a waiver',
      before: {},
      set: { waivers: [waiver] },
      finds: {
        field: 'waivers[0]',
        message: 'adds a waiver of inputs.unverified inputs.rainfall, until 2021-06-30',
      },
    },
    {
      name: 'a longer waiver',
      before: { set: { waivers: [waiver] } },
      set: { waivers: [{ ...waiver, until: '2022-06-30' }] },
      finds: { message: 'from 2021-06-30 to 2022-06-30' },
    },
    {
      name: 'a waiver for more records',
      before: { set: { waivers: [waiver] } },
      set: { waivers: [{ rule: waiver.rule, until: waiver.until }] },
      finds: { subject: 'inputs.unverified' },
    },
    {
      name: 'an acceptance',
      before: {},
      set: { 'evaluation.outlet-flow.accepts': [{ rule: 'evaluation.single-score' }] },
      finds: {
        field: 'evaluation.outlet-flow.accepts[0]',
        message: 'accepts evaluation.single-score for evaluation.outlet-flow',
      },
    },
    {
      name: 'an acceptance for another driver',
      before: { set: { 'scenarios.cases.dry.accepts': [{ rule: 'seal.stale', driver: 'a' }] } },
      set: {
        'scenarios.cases.dry.accepts': [
          { rule: 'seal.stale', driver: 'a' },
          { rule: 'seal.stale', driver: 'b' },
        ],
      },
      finds: { field: 'scenarios.cases.dry.accepts[1]' },
    },
  ],
  silent: [
    { name: 'nothing before', set: { waivers: [waiver] } },
    { name: 'a later phase', before: { set: { 'study.phase': 'setup' } } },
    {
      name: 'a stricter level',
      before: { set: { departures: [{ rule: 'seal.stale', now: 'warns', because: 'x' }] } },
      set: { departures: [{ rule: 'seal.stale', now: 'blocks', because: 'x' }] },
    },
    {
      name: 'a shorter waiver, with another reason',
      before: { set: { waivers: [waiver] } },
      set: { waivers: [{ ...waiver, until: '2021-04-01', because: 'y' }] },
    },
    {
      name: 'an acceptance with another reason',
      before: { set: { 'study.accepts': [{ rule: 'seal.stale', because: 'x' }] } },
      set: { 'study.accepts': [{ rule: 'seal.stale', because: 'y' }] },
    },
  ],
});
