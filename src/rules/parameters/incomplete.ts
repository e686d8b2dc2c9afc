import type { ParameterValue } from '../../manifest/data.generated.ts';
import { rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';
import { placeOf } from './place.ts';

export const parametersIncomplete = rule({
  id: 'parameters.incomplete',
  scope: 'parameters',
  from: 'calibration',
  means: 'incomplete',
  statement:
    'A parameter lacks its unit, value, way of change, range or the source of its range, or a row of its table can’t be read.',
  why: 'A number without unit and range can’t be judged: nobody sees whether it is physically possible or whether the search stopped at its wall.',
  source: { basis: 'practice', citation: 'Common practice in reporting calibrations.' },
  clear:
    'Fill in what is missing; a parameter that was not calibrated says `calibrated: false` and needs unit and value only.',
  check: (_, { parameters }) => [
    ...parameters.unread.map(({ file, line, expected, found }) => ({
      record: 'parameters',
      subject: `${file} ${line}`,
      file,
      line,
      message: `A row of the parameter table can’t be read: expected ${expected}, received "${found}".`,
      clear: 'Correct the row; its columns are named as the keys of a parameter in the manifest.',
    })),
    ...parameters.values.flatMap((of) => {
      const missing = missingIn(of.parameter);
      if (missing.length === 0) return [];
      return [
        {
          ...placeOf(of),
          message: `Parameter ${of.label} lacks ${missing.join(', ')}.`,
        },
      ];
    }),
  ],
});

function missingIn(parameter: ParameterValue): readonly string[] {
  const { unit, value, change, range, range_from, initial, by, calibrated } = parameter;
  const always = [isStated(unit) ? null : 'unit', value === undefined ? 'value' : null];
  const calibration = [
    change === undefined ? 'way of change (`change`)' : null,
    range === undefined ? 'range' : null,
    isStated(range_from) ? null : 'source of its range (`range_from`)',
    change !== undefined && change !== 'set' && initial === undefined ? 'initial value' : null,
    change !== undefined && change !== 'set' && by === undefined ? 'amount of the change (`by`)' : null,
  ];
  return [...always, ...(calibrated === false ? [] : calibration)].filter((one) => one !== null);
}
