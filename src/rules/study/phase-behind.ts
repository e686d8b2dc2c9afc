import type { ManifestData } from '../../manifest/data.generated.ts';
import { type Phase, phases, rule } from '../rule.ts';

export const studyPhaseBehind = rule({
  id: 'study.phase-behind',
  scope: 'manifest',
  from: 'warn',
  means: null,
  statement: 'Records of a later phase exist than `study.phase` says.',
  why: 'The phase decides what is asked for. Validation scores or scenarios in a study that still calls itself a calibration pass without the checks that those results need.',
  source: {
    basis: 'house',
    citation: 'Our own choice: each record belongs to the phase that first needs it.',
  },
  clear: 'Set `study.phase` to the phase that the study has reached.',
  check(_, { manifest: { data } }) {
    const stated = data.study?.phase ?? 'setup';
    const [reached, because] = furthest(data);
    if (phases.indexOf(reached) <= phases.indexOf(stated)) return [];
    return [
      {
        record: 'study',
        field: ['study', 'phase'],
        stated,
        found: reached,
        message: `The study is said to be in phase \`${stated}\`, but it has ${because}, which belong to phase \`${reached}\`.`,
      },
    ];
  },
});

/** The latest phase that something in the manifest belongs to, and what that is. */
function furthest(data: ManifestData): readonly [Phase, string] {
  const targets = Object.values(data.evaluation ?? {});
  if (Object.keys(data.scenarios?.cases ?? {}).length > 0) return ['application', 'scenarios'];
  if (targets.some((target) => target.scores?.validation !== undefined))
    return ['validation', 'scores over the validation'];
  if (targets.some((target) => target.scores !== undefined)) return ['calibration', 'scores'];
  if (data.parameters !== undefined) return ['calibration', 'calibrated parameters'];
  return ['setup', ''];
}
