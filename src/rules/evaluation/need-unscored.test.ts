import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { evaluationNeedUnscored } from './need-unscored.ts';

const scores = 'evaluation.outlet-flow.scores';
const high = { 'study.needs': [{ variable: 'streamflow', regime: 'high' }] };

ruleCases(evaluationNeedUnscored, {
  fires: [
    {
      name: 'low flows without a score of theirs',
      remove: [`${scores}.calibration.log_nse`, `${scores}.validation.log_nse`],
      finds: {
        record: 'evaluation.outlet-flow',
        field: scores,
        subject: 'low',
        level: 'block',
        message: /needs low flows, but no calibration or validation score of outlet-flow .*`log_nse`.*`flv`/,
      },
    },
    {
      name: 'in one window only',
      remove: [`${scores}.validation.log_nse`],
      finds: { subject: 'low', message: 'no validation score of outlet-flow' },
    },
    {
      name: 'a second target without any score answers nothing',
      set: { 'evaluation.upper': { variable: 'streamflow' } },
      remove: [`${scores}.calibration.log_nse`, `${scores}.validation.log_nse`],
      finds: { record: 'evaluation.outlet-flow', subject: 'low', message: 'score of outlet-flow' },
    },
    { name: 'high flows without peaks', set: high, finds: { subject: 'high', message: '`peaks_hit`' } },
    { name: 'only noted while calibrating', set: high, phase: 'calibration', finds: { level: 'note' } },
  ],
  silent: [
    {
      name: 'the low segment of the flow-duration curve',
      set: { [scores]: { calibration: { flv: 3.6 }, validation: { flv: 8.7 } } },
    },
    {
      name: 'peaks',
      set: { ...high, [scores]: { calibration: { peaks_hit: 0.6 }, validation: { peaks_hit: 0.5 } } },
    },
    {
      name: 'a second target that scores them',
      set: {
        'evaluation.upper': { variable: 'streamflow', scores: { calibration: { log_nse: 0.5 } } },
        [scores]: { calibration: { nse: 0.966 } },
      },
    },
    {
      name: 'low groundwater levels have no such score',
      set: { 'study.needs': [{ variable: 'groundwater_level', regime: 'low' }] },
      remove: [`${scores}.calibration.log_nse`],
    },
    { name: 'no score at all, which is another rule’s', remove: [scores] },
    { name: 'nothing is evaluated, which is another rule’s', remove: ['evaluation'] },
  ],
});
