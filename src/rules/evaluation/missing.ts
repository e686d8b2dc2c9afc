import type { EvaluationTarget } from '../../manifest/data.generated.ts';
import { type Draft, rule } from '../rule.ts';

export const evaluationMissing = rule({
  id: 'evaluation.missing',
  scope: 'manifest',
  from: 'calibration',
  means: 'missing',
  statement:
    'A variable that the purpose needs is evaluated nowhere, or a target has no calibration or (from validation) no validation scores.',
  why: 'A model is judged on what it is used for: a low-flow question answered by a model whose flow was never compared with a gauge is a guess.',
  source: {
    basis: 'practice',
    citation: 'Common practice: each variable that the purpose needs is compared with observations.',
  },
  clear:
    'Add a target under evaluation with its observed input, its simulated column and its scores; or say under `none_because` why a variable can’t be evaluated.',
  check: (_, { manifest }) => {
    const targets = Object.entries(manifest.data.evaluation ?? {});
    const evaluated = new Set(targets.map(([, { variable }]) => variable));
    const needed = new Set(
      (manifest.data.study?.needs ?? []).map(({ variable }) => variable ?? 'streamflow'),
    );
    const unevaluated = [...needed].filter((variable) => !evaluated.has(variable));
    if (targets.length === 0 && needed.size === 0) {
      return [
        {
          record: 'evaluation',
          field: ['evaluation'],
          message: 'Nothing that the model simulates is compared with observations.',
        },
      ];
    }
    return [
      ...unevaluated.map((variable) => ({
        record: 'evaluation',
        field: ['evaluation'],
        subject: variable,
        message: `The purpose needs ${variable.replaceAll('_', ' ')}, but no target compares it with observations.`,
      })),
      ...targets.flatMap(([name, target]) => withoutScores(name, target)),
    ];
  },
});

function withoutScores(name: string, { scores, none_because }: EvaluationTarget): readonly Draft[] {
  if (none_because !== undefined || scores?.table !== undefined) return [];
  return (['calibration', 'validation'] as const)
    .filter((window) => Object.keys(scores?.[window] ?? {}).length === 0)
    .map((window) => ({
      record: `evaluation.${name}`,
      field: ['evaluation', name, 'scores'],
      subject: window,
      from: window,
      message: `No ${window} scores are stated for ${name}.`,
    }));
}
