import { rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';
import { declared } from './declared.ts';

export const interventionsUndeclared = rule({
  id: 'interventions.undeclared',
  scope: 'interventions',
  from: 'calibration',
  means: 'missing',
  statement: 'Neither human interventions nor the reason why there are none are stated.',
  why: 'Reservoirs, abstractions, irrigation and drains change flows, low ones most; a model calibrated without them puts their water into its parameters.',
  source: { basis: 'practice', citation: 'Common practice in describing a catchment.' },
  clear: 'List what people do to the water under interventions, or say {none_because: ...}.',
  check: ({ id, fragment }) => {
    const reason = 'none_because' in fragment ? fragment.none_because : undefined;
    if (declared(fragment).length > 0 || isStated(reason)) return [];
    return [
      {
        record: id,
        field: ['interventions'],
        message: 'Nothing says whether people take, store, drain or return water in this catchment.',
      },
    ];
  },
});
