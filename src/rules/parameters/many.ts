import { rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';
import { calibratedCount } from './calibrated.ts';

export const parametersMany = rule({
  id: 'parameters.many',
  scope: 'parameters',
  from: 'warn',
  means: null,
  statement: 'More than six parameters were calibrated, and no sensitivity analysis is recorded.',
  why: 'Daily rain and flow can tell about four to six parameters apart. More of them fit the calibration and scatter elsewhere.',
  source: {
    basis: 'published',
    citation:
      'Jakeman, A. J. & Hornberger, G. M. (1993) How much complexity is warranted in a rainfall-runoff model? Water Resour. Res. 29(8):2637-2649 (four to six, from memory)',
  },
  clear:
    'Show with a sensitivity analysis (`sensitivity`) which parameters the data can tell, and fix the others (`calibrated: false`).',
  limits: {
    calibrated: {
      default: 6,
      unit: 'parameters',
      states: 'most calibrated parameters without a sensitivity analysis',
      looser: 'higher',
    },
  },
  check: ({ id, fragment }, { parameters }, limits) => {
    const count = calibratedCount(parameters.values);
    if (count <= (limits.calibrated ?? 0) || isStated(fragment.sensitivity?.method)) return [];
    return [
      {
        record: id,
        field: ['parameters'],
        found: count,
        unit: 'parameters',
        message: `${count} parameters were calibrated, and nothing shows that the data can tell them apart.`,
      },
    ];
  },
});
