import type { Facts } from '../../facts/facts.ts';
import { nodesIn } from '../../facts/nodes-in.ts';
import { whyUnscored } from '../../facts/score-figures.ts';
import { scoredWindows } from '../../facts/scores/stated.ts';
import type { RecordNode } from '../../records/record.ts';
import { type Draft, rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';

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
  check: (_, facts) => {
    const targets = nodesIn(facts.records.nodes, 'evaluation');
    const evaluated = new Set(targets.map(({ fragment }) => fragment.variable));
    const needed = new Set(
      (facts.manifest.data.study?.needs ?? []).map(({ variable }) => variable ?? 'streamflow'),
    );
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
      ...[...needed]
        .filter((variable) => !evaluated.has(variable))
        .map((variable) => ({
          record: 'evaluation',
          field: ['evaluation'],
          subject: variable,
          message: `The purpose needs ${variable.replaceAll('_', ' ')}, but no target compares it with observations.`,
          ...unnamed(targets, variable),
        })),
      ...targets.flatMap((target) => withoutScores(target, facts)),
    ];
  },
});

/** A target that names no variable may be the one that is looked for. */
function unnamed(
  targets: readonly RecordNode<'evaluation'>[],
  variable: string,
): { readonly clear: string } | Record<string, never> {
  const first = targets.find(({ fragment }) => fragment.variable === undefined);
  if (first === undefined) return {};
  return {
    clear: `${first.id} does not say which variable it compares: write \`variable: ${variable}\` there if it is this one; else add a target for it.`,
  };
}

function withoutScores(
  { id, name, field, fragment }: RecordNode<'evaluation'>,
  { scores }: Facts,
): readonly Draft[] {
  if (isStated(fragment.none_because)) return [];
  const figures = scores.get(name ?? '');
  return scoredWindows
    .filter((window) => !figures?.stated.some((score) => score.window === window))
    .map((window) => {
      const hindrance = figures === undefined ? null : whyUnscored(figures, window);
      return {
        record: id,
        field: [...field, 'scores'],
        subject: window,
        from: window,
        message: `No ${window} scores are stated for ${name}${hindrance === null ? '.' : `, nor can they be computed: ${hindrance}.`}`,
        clear: `${hindrance === null ? '' : 'Clear that first. Then '}\`stoplog seal --figures ${id}\` computes and writes them; or state them under scores.${window}.`,
      };
    });
}
