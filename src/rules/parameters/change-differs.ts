import { isDefined } from '../../hydrology/paired.ts';
import { changedValue } from '../../hydrology/parameters/changed-value.ts';
import { printedInterval, printedNumber } from '../../hydrology/stated/printed-number.ts';
import type { ParameterValue } from '../../manifest/data.generated.ts';
import { rule } from '../rule.ts';
import { placeOf } from './place.ts';

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
  check: (_, { parameters }) =>
    parameters.values.flatMap((of) => {
      const { parameter, written, label } = of;
      const given = changed(parameter);
      if (given === null || parameter.value === undefined) return [];
      const printed = printedNumber(written ?? '');
      if (printed === null) return [];
      const { lowest, highest } = printedInterval(printed);
      // A product of two decimals is rarely exact in binary.
      const slack = 1e-12 * Math.abs(given);
      if (given >= lowest - slack && given <= highest + slack) return [];
      return [
        {
          ...placeOf(of, 'value'),
          stated: parameter.value,
          found: Number(given.toPrecision(10)),
          ...(parameter.unit === undefined ? {} : { unit: parameter.unit }),
          message: `Parameter ${label}: ${arithmetic(parameter)} is not the final value.`,
        },
      ];
    }),
});

function changed({ change, initial, by }: ParameterValue): number | null {
  if (change === undefined || by === undefined || (change !== 'set' && initial === undefined)) return null;
  const given = changedValue({ change, initial: initial ?? 0, by });
  // A factor of zero leaves nothing.
  return isDefined(given) ? given.value : 0;
}

function arithmetic({ change, initial, by }: ParameterValue): string {
  if (change === 'set') return `the value it was set to, ${by},`;
  return change === 'shift' ? `${initial} shifted by ${by}` : `${initial} scaled by ${by}`;
}
