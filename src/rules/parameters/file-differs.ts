import { rule } from '../rule.ts';
import { placeOf } from './place.ts';

export const parametersFileDiffers = rule({
  id: 'parameters.file-differs',
  scope: 'parameters',
  from: 'calibration',
  means: 'contradicted',
  statement:
    'The model’s own parameter file (`model_file`) has another value than the record, or lacks the parameter.',
  why: 'The model runs with its file, not with the record. Where they differ, nobody knows which values the results belong to.',
  source: {
    basis: 'definition',
    citation: 'Follows from the words: the record states what the model ran with.',
  },
  clear:
    'Correct the one that is wrong. If the file is, run the model again. Values that the file has otherwise (a factor, another unit) belong in `readings`.',
  check: (_, { parameters }) =>
    parameters.inModel
      .filter(({ agrees }) => !agrees)
      .map(({ of, file, line, found, problem }) => {
        const { unit } = of.parameter;
        return {
          ...placeOf(of, 'value'),
          ...(of.written === null ? {} : { stated: Number(of.written) }),
          ...(found === null ? {} : { found }),
          ...(unit === undefined || unit === '1' ? {} : { unit }),
          message:
            problem === null
              ? `${of.label} is ${of.written} in the record, and ${found} in ${file} line ${line}.`
              : `${file}${line === null ? '' : ` line ${line}`} ${problem}.`,
        };
      }),
});
