import { rule } from '../rule.ts';

export const studyNeedsMissing = rule({
  id: 'study.needs-missing',
  scope: 'study',
  from: 'calibration',
  means: 'incomplete',
  statement:
    '`needs` does not state the variable and the regime (low, mean, high, whole) that the purpose needs.',
  why: 'Scores are chosen by what is needed: log-NSE and the low segment of the flow-duration curve for droughts, peaks for floods. Unless the need is stated, a good NSE on storms can pass for a good low-flow model.',
  source: {
    basis: 'practice',
    citation: 'Common practice: the objective function and the scores follow from the purpose.',
  },
  clear: 'Write for instance `needs: [{variable: streamflow, regime: low}]` under `study`.',
  check({ id, fragment: { needs = [] } }) {
    if (needs.length === 0) {
      return [
        {
          record: id,
          field: ['study', 'needs'],
          message:
            'Nothing says which variable the purpose needs, nor whether its low, mean or high values matter.',
        },
      ];
    }
    return needs.flatMap(({ variable, regime }, place) =>
      variable !== undefined && regime !== undefined
        ? []
        : {
            record: id,
            field: ['study', 'needs', place],
            subject: variable ?? regime ?? '',
            message: `This need names no ${variable === undefined ? 'variable' : 'regime (low, mean, high or whole)'}.`,
          },
    );
  },
});
