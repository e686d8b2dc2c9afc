import { missingShares } from '../../facts/missing-shares.ts';
import { rule } from '../rule.ts';

export const inputsGapUntreated = rule({
  id: 'inputs.gap-untreated',
  scope: 'inputs',
  from: 'calibration',
  means: 'incomplete',
  statement:
    'Values are missing, as stated or as counted in the files, and nothing says how the gaps were treated.',
  why: 'Gaps filled with zero, with a neighbour’s rain or left out of the comparison give different water balances and scores; nobody can repeat the run without knowing which.',
  source: { basis: 'practice', citation: 'Common practice: the treatment of gaps is told with the data.' },
  clear: 'Say in `gaps_treated` how gaps were filled, or that they were left and the pairs dropped.',
  check: (record, { profiles, manifest }) => {
    const { id, name, field, fragment } = record;
    const { missing_share: share, gaps_treated } = fragment;
    if (gaps_treated !== undefined) return [];
    const perFile =
      typeof share === 'object' && 'per_file' in share ? Math.max(0, ...Object.values(share.per_file)) : null;
    const stated = perFile ?? (typeof share === 'number' ? share : 0);
    const profile = profiles.get(name ?? '');
    const counted = profile === undefined ? [] : missingShares(record, profile, manifest);
    const found = Math.max(0, ...counted.map((one) => one.found));
    if (stated <= 0 && found <= 0) return [];
    const most = Number((stated > 0 ? stated : found).toPrecision(3));
    return [
      {
        record: id,
        field: [...field, 'missing_share'],
        ...(stated > 0 ? { stated } : { found: most }),
        message: `${perFile === null ? 'A' : 'In one of the files a'} share of ${most} of the values is missing, and nothing says how the gaps were treated.`,
      },
    ];
  },
});
