import { rule } from '../rule.ts';

export const inputsGapUntreated = rule({
  id: 'inputs.gap-untreated',
  scope: 'inputs',
  from: 'calibration',
  means: 'incomplete',
  statement: 'Values are missing and nothing says how the gaps were treated.',
  why: 'Gaps filled with zero, with a neighbour’s rain or left out of the comparison give different water balances and scores; nobody can repeat the run without knowing which.',
  source: { basis: 'practice', citation: 'Common practice: the treatment of gaps is told with the data.' },
  clear: 'Say in `gaps_treated` how gaps were filled, or that they were left and the pairs dropped.',
  check: ({ id, field, fragment: { missing_share: share, gaps_treated } }) => {
    const stated = typeof share === 'object' ? Math.max(0, ...Object.values(share.per_file)) : (share ?? 0);
    if (stated <= 0 || gaps_treated !== undefined) return [];
    return [
      {
        record: id,
        field: [...field, 'missing_share'],
        stated,
        message: `${typeof share === 'object' ? 'In one of the files a' : 'A'} share of ${stated} of the values is missing, and nothing says how the gaps were treated.`,
      },
    ];
  },
});
