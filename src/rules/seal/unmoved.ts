import { isUnmoved, unmovedBelow } from '../../records/unmoved.ts';
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
  check: (_, { records, sealsFile, sealsBefore }) =>
    [...records.nodes.values()].flatMap(({ id, area }) => {
      const [seal, before] = [sealsFile.seals.get(id), sealsBefore.get(id)];
      if (seal === undefined || !isUnmoved(seal, before)) return [];
      const below = new Set([...seal.unmoved, ...(before === undefined ? [] : unmovedBelow(before, seal))]);
      const [outcome, again] =
        area === 'parameters'
          ? ['the calibrated values', 'Calibrate again']
          : ['the outputs', 'Run the model again'];
      return {
        record: id,
        message: `When this was sealed on ${seal.sealed_on}, ${few([...below])} had changed, but ${outcome} had not.`,
        clear: `${again} and seal, or say why nothing moved: stoplog seal ${id} --because "..."`,
      };
    }),
});
