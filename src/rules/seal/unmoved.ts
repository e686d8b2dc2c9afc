import { few } from '../figures.ts';
import { rule } from '../rule.ts';

export const sealUnmoved = rule({
  id: 'seal.unmoved',
  scope: 'manifest',
  from: 'validation',
  means: null,
  statement:
    'A run was sealed though its inputs had changed and its outputs had not, or parameters though their calibration data had changed and they had not, with neither a rerun nor a reason.',
  why: 'Other rain gives other flow. Outputs that did not move when the inputs did are most likely those of the old inputs, and every score and balance above them is too.',
  source: { basis: 'house', citation: 'Our own choice: a result that should have moved needs its reason.' },
  clear:
    'Run the model (or calibrate) again and seal, or say why nothing moved: stoplog seal RECORD --because "..."',
  check: (_, { records, sealsFile }) =>
    [...sealsFile.seals].flatMap(([id, { unmoved, because, grade, sealed_on }]) =>
      !records.nodes.has(id) || unmoved.length === 0 || because !== null || grade === 'rerun'
        ? []
        : {
            record: id,
            message: `When this was sealed on ${sealed_on}, ${few(unmoved)} had changed, but ${
              id === 'parameters' ? 'the calibrated values' : 'the outputs'
            } had not.`,
            clear: `${id === 'parameters' ? 'Calibrate again' : 'Run the model again'} and seal, or say why nothing moved: stoplog seal ${id} --because "..."`,
          },
    ),
});
