import { rule } from '../rule.ts';

const asked = {
  purpose: 'Nothing says what the model is to tell (variable, place, season).',
  decision: 'Nothing says which decision the results serve.',
} as const;

export const studyPurposeMissing = rule({
  id: 'study.purpose-missing',
  scope: 'study',
  from: 'setup',
  means: 'incomplete',
  statement: 'The study states no purpose, or no decision that it serves.',
  why: 'Which errors matter depends on the purpose: a model good enough for mean annual yield can be useless for a drought rule or a flood level. Without it nobody can judge the fit, the uncertainty or the scenarios.',
  source: {
    basis: 'published',
    citation:
      'U.S. Environmental Protection Agency (2002) Guidance for Quality Assurance Project Plans for Modeling, EPA QA/G-5M, EPA/240/R-02/007, Washington, DC; ASABE (2017) Engineering Practice EP621: Guidelines for Calibrating, Validating, and Evaluating Hydrologic and Water Quality (H/WQ) Models, St. Joseph, Michigan',
  },
  clear: 'Write `purpose` and `decision` under `study`, a sentence each.',
  check: ({ id, fragment }) =>
    (['purpose', 'decision'] as const)
      .filter((key) => fragment[key] === undefined)
      .map((key) => ({ record: id, field: ['study', key], subject: key, message: asked[key] })),
});
