import { printedInterval, printedNumber } from '../../hydrology/stated/printed-number.ts';
import type { ParameterValue } from '../../manifest/data.generated.ts';
import { rule } from '../rule.ts';

export const parametersChangeDiffers = rule({
  id: 'parameters.change-differs',
  scope: 'parameters',
  from: 'calibration',
  means: 'contradicted',
  statement: 'The initial value with the stated change does not give the stated final value.',
  why: 'One of the three numbers is not the one that was used, and only one combination repeats the run.',
  source: {
    basis: 'definition',
    citation:
      'Arithmetic: set gives `by`, shift initial + by, scale initial x by, within the final value’s decimals.',
  },
  clear: 'Compare with the calibration’s own output and correct the number that is wrong.',
  check: ({ id, fragment }, { manifest }) =>
    (fragment.values ?? []).flatMap((parameter, index) => {
      const given = changed(parameter);
      if (given === null || parameter.value === undefined) return [];
      const field = ['parameters', 'values', index];
      const printed = printedNumber(manifest.source([...field, 'value']) ?? String(parameter.value));
      if (printed === null) return [];
      const { lowest, highest } = printedInterval(printed);
      // A product of two decimals is rarely exact in binary.
      const slack = 1e-12 * Math.abs(given);
      if (given >= lowest - slack && given <= highest + slack) return [];
      return [
        {
          record: id,
          field: [...field, 'value'],
          subject: parameter.name,
          stated: parameter.value,
          found: Number(given.toPrecision(10)),
          ...(parameter.unit === undefined ? {} : { unit: parameter.unit }),
          message: `Parameter ${parameter.name}: ${arithmetic(parameter)} is not the final value.`,
        },
      ];
    }),
});

function changed({ change, initial, by }: ParameterValue): number | null {
  if (by === undefined) return null;
  if (change === 'set') return by;
  if (initial === undefined) return null;
  return change === 'shift' ? initial + by : change === 'scale' ? initial * by : null;
}

function arithmetic({ change, initial, by }: ParameterValue): string {
  if (change === 'set') return `the value it was set to, ${by},`;
  return change === 'shift' ? `${initial} shifted by ${by}` : `${initial} scaled by ${by}`;
}
