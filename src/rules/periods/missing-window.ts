import type { Manifest } from '../../manifest/manifest.ts';
import type { Draft } from '../rule.ts';

/** One draft where neither the study nor every one of its targets states the window. */
export function missingWindow({ data }: Manifest, kind: 'calibration' | 'validation'): readonly Draft[] {
  if ((data.periods?.[kind] ?? []).length > 0) return [];
  const targets = Object.values(data.evaluation ?? {});
  if (targets.length > 0 && targets.every((target) => (target.periods?.[kind] ?? []).length > 0)) return [];
  return [
    {
      record: 'periods',
      field: ['periods', kind],
      message: `No ${kind} window is stated for the study.`,
    },
  ];
}
