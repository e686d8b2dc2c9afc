import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { setupChoiceUnjustified } from './choice-unjustified.ts';

ruleCases(setupChoiceUnjustified, {
  fires: [
    {
      name: 'no reason',
      remove: ['setup.choices.1.because'],
      finds: {
        record: 'setup',
        field: 'setup.choices[1]',
        subject: 'evapotranspiration',
        level: 'block',
        message: 'why temperature method was chosen for evapotranspiration',
      },
    },
    {
      name: 'a default needs one, too',
      remove: ['setup.choices.3.because'],
      finds: { subject: 'routing' },
    },
    {
      name: 'a stand-in',
      set: { 'setup.choices.0.because': 'as usual' },
      finds: { subject: 'spatial units' },
    },
    {
      name: 'only noted while calibrating',
      remove: ['setup.choices.1.because'],
      phase: 'calibration',
      finds: { level: 'note' },
    },
  ],
  silent: [{ name: 'nothing was chosen, which is another rule’s', remove: ['setup.choices'] }],
});
