import type { FieldPath, Manifest } from '../../manifest/manifest.ts';
import { type Period, parsePeriod } from '../../manifest/period.ts';

export interface Window {
  readonly kind: 'warm-up' | 'calibration' | 'validation';
  readonly field: FieldPath;
  readonly period: Period;
}

/** The windows of the study, or of one target that states its own. */
export interface WindowSet {
  /** `periods`, or the target's record. */
  readonly record: string;
  readonly windows: readonly Window[];
}

/** The study's windows first, then those of each target that states windows of its own (the study's fill what it leaves out). */
export function windowSets({ data }: Manifest): readonly WindowSet[] {
  const shared = {
    warm_up: data.periods?.warm_up,
    calibration: data.periods?.calibration,
    validation: data.periods?.validation,
  };
  const own = Object.entries(data.evaluation ?? {}).flatMap(([name, { periods }]) =>
    periods === undefined
      ? []
      : [{ record: `evaluation.${name}`, stated: periods, base: ['evaluation', name, 'periods'] }],
  );
  return [
    { record: 'periods', windows: windowsIn(shared, ['periods']) },
    ...own.map(({ record, stated, base }) => {
      const inherited = Object.fromEntries(Object.entries(shared).filter(([key]) => !(key in stated)));
      return { record, windows: [...windowsIn(stated, base), ...windowsIn(inherited, ['periods'])] };
    }),
  ];
}

interface Stated {
  readonly warm_up?: string | { readonly zero_because: string } | undefined;
  readonly calibration?: readonly string[] | undefined;
  readonly validation?: readonly string[] | undefined;
}

function windowsIn(stated: Stated, base: FieldPath): readonly Window[] {
  const texts = [
    ...(typeof stated.warm_up === 'string'
      ? [{ kind: 'warm-up' as const, field: [...base, 'warm_up'], text: stated.warm_up }]
      : []),
    ...(['calibration', 'validation'] as const).flatMap((kind) =>
      (stated[kind] ?? []).map((text, index) => ({ kind, field: [...base, kind, index], text })),
    ),
  ];
  return texts.flatMap(({ kind, field, text }) => {
    const period = parsePeriod(text);
    return period === null ? [] : [{ kind, field, period }];
  });
}
