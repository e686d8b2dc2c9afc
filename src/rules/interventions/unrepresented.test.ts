import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { interventionsUnrepresented } from './unrepresented.ts';

ruleCases(interventionsUnrepresented, {
  fires: [
    {
      name: 'left out without a reason',
      remove: ['interventions.1.because'],
      finds: {
        record: 'interventions',
        field: 'interventions[1]',
        subject: 'irrigation water meadows',
        level: 'block',
        message: 'nothing says why that is tolerable',
      },
    },
    {
      name: 'represented, and nothing says how',
      remove: ['interventions.0.how'],
      finds: { field: 'interventions[0]', message: 'how the reservoir mill pond is represented' },
    },
    {
      name: 'nothing says whether',
      set: { interventions: [{ kind: 'abstraction' }] },
      finds: { subject: 'abstraction', message: 'The abstraction is not represented' },
    },
    {
      name: 'only noted while calibrating',
      remove: ['interventions.1.because'],
      phase: 'calibration',
      finds: { level: 'note' },
    },
  ],
  silent: [
    { name: 'none declared, which is another rule’s', remove: ['interventions'] },
    { name: 'none, with the reason', set: { interventions: { none_because: 'headwater' } } },
  ],
});
