import { expect } from 'vitest';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { soundFiles } from '../../../tests/harness/sound-files.ts';
import { figure } from '../figures.ts';
import { sealStale } from './stale.ts';

/** The sum of the rain, counted from the text of the file. */
const rainMm = (soundFiles()['data/rain.csv'] ?? '')
  .split('\n')
  .slice(1)
  .reduce((sum, line) => sum + Number(line.split(',')[1] ?? 0), 0);

ruleCases(sealStale, {
  fires: [
    {
      name: 'one value of the data, and all that rests on it',
      seals: 'sound',
      files: {
        'data/rain.csv': (old) =>
          old
            .replace('2007-01-04,0.0000', '2007-01-04,9.0000')
            .replace('2007-01-16,0.0000', '2007-01-16,2.5000'),
      },
      phase: 'calibration',
      finds: [
        {
          record: 'inputs.rainfall',
          level: 'block',
          message: 'data/rain.csv is not the file that was sealed on 2021-02-01.',
          trail: ['inputs.rainfall', 'data/rain.csv'],
          detail: [
            `2 of 3 287 values differ; total ${figure(rainMm)} -> ${figure(rainMm + 11.5)} mm (+${(1150 / rainMm).toFixed(2)} %), 2007-01-04 to 2007-01-16`,
          ],
          clear: 'Check what changed, then: stoplog seal inputs.rainfall',
        },
        {
          record: 'parameters',
          level: 'warn',
          trail: ['parameters', 'inputs.rainfall', 'data/rain.csv'],
          clear: 'Calibrate again',
        },
        { record: 'runs.calibrated', level: 'warn', clear: 'Run the model again' },
        { record: 'runs.dry', trail: ['runs.dry', 'parameters', 'inputs.rainfall', 'data/rain.csv'] },
        {
          record: 'evaluation.outlet-flow',
          message: 'What this rests on has changed since it was sealed on 2021-02-01.',
          clear: '--figures evaluation.outlet-flow',
        },
        { record: 'balance.catchment' },
        { record: 'interventions' },
        { record: 'uncertainty' },
        { record: 'scenarios.dry' },
      ],
    },
    {
      name: 'other line ends only',
      seals: 'sound',
      files: { 'data/leaf-area.csv': (old) => old.replaceAll('\n', '\r\n') },
      finds: [
        {
          record: 'inputs.vegetation',
          level: 'block',
          detail: ['no value differs; only how the file is written (line ends, names, order)'],
        },
        { record: 'interventions' },
      ],
    },
    {
      name: 'a row that can’t be read, and no other value',
      seals: 'sound',
      files: { 'data/leaf-area.csv': (old) => `${old}x\n` },
      finds: [
        {
          record: 'inputs.vegetation',
          detail: ['no value that can be read differs, but 1 row can’t be read'],
        },
        { record: 'interventions' },
      ],
    },
    {
      name: 'a sum that tells no amount',
      seals: 'sound',
      files: { 'data/temperature.csv': (old) => old.replace('2001-10-01,11.1688', '2001-10-01,21.1688') },
      phase: 'setup',
      finds: [
        {
          record: 'inputs.temperature',
          level: 'warn',
          detail: [
            expect.stringMatching(
              /^1 of 3 287 values differ; sum of values .* degC \(\+.* %\), on 2001-10-01$/,
            ),
          ],
        },
        {},
        {},
        {},
        {},
        {},
        {},
        {},
        {},
      ],
    },
    {
      name: 'a statement',
      seals: 'sound',
      set: { 'catchment.area.value': 51 },
      finds: {
        record: 'catchment',
        message: 'What this record states was changed',
        trail: ['catchment'],
        detail: [],
      },
    },
    {
      name: 'a statement, where the commit before has it as it was sealed',
      seals: 'sound',
      before: {},
      set: { 'catchment.area.value': 51 },
      finds: { record: 'catchment', detail: ['area.value: 50 -> 51'] },
    },
    {
      name: 'a statement that the commit before has neither as it is nor as it was sealed',
      seals: 'sound',
      before: { set: { 'catchment.area.value': 49 } },
      set: { 'catchment.area.value': 51 },
      finds: { record: 'catchment', detail: [] },
    },
    {
      name: 'fields added and taken away, in a list of names and in what stands beside the record',
      seals: 'sound',
      before: {},
      remove: ['interventions.0.default'],
      set: {
        'interventions.1.represented': true,
        'interventions.2': { kind: 'weir', name: 'old weir' },
        'seasons.0.variable': 'irrigation',
      },
      finds: {
        record: 'interventions',
        detail: [
          'mill pond.default: false -> nothing',
          'water meadows.represented: false -> true',
          'old weir: nothing -> {"kind":"weir","name":"old weir"}',
          'seasons[0].variable: leaf_area -> irrigation',
        ],
      },
    },
    {
      name: 'many fields',
      seals: 'sound',
      before: {},
      set: {
        'model.name': 'another',
        'model.version': '9',
        'model.release': '9.1',
        'model.released': '2020-01-01',
        'model.source': { doi: '10.5555/a', url: 'https://a.example' },
      },
      finds: [
        { record: 'model', detail: expect.arrayContaining(['version: 2.1 -> 9', 'and 2 more fields']) },
        ...Array(8).fill({}),
      ],
    },
    {
      name: 'a file gone, one changed, one new',
      seals: 'sound',
      files: { 'calibration/sensitivity.csv': null, 'model/new.txt': 'x' },
      set: { 'parameters.files': ['model/new.txt'] },
      finds: [
        {
          record: 'parameters',
          message:
            'What this record states was changed since it was sealed on 2021-02-01. calibration/sensitivity.csv is gone since this was sealed on 2021-02-01. model/new.txt was not there when this was sealed on 2021-02-01.',
        },
        ...Array(7).fill({}),
      ],
    },
    {
      name: 'the simulated series of a run, as its evaluation lays it out',
      seals: 'sound',
      files: {
        'runs/calibrated/daily.csv': (old) => old.replace(/^(2009-07-04(?:,[^,]+){4}),[^,]+/m, '$1,9.0000'),
      },
      finds: [
        {
          record: 'runs.calibrated',
          detail: [
            expect.stringMatching(
              /^1 of 3 287 values differ; sum of values .* m3\/s \(.* %\), on 2009-07-04$/,
            ),
          ],
        },
        ...Array(5).fill({}),
      ],
    },
    {
      name: 'content that is not here',
      seals: 'sound',
      files: { 'model/pond.txt': { link: 'gone.txt' } },
      finds: [
        { record: 'runs.calibrated', level: 'block' },
        { record: 'runs.dry' },
        {},
        {},
        { record: 'interventions', message: 'model/pond.txt can’t be read here' },
        {},
        {},
      ],
    },
    {
      name: 'a script that is no series',
      seals: 'sound',
      files: { 'data/prepare.mjs': '// Invented: by 1.05 instead.\n' },
      finds: [{ record: 'inputs.rainfall', detail: ['50 -> 30 bytes'] }, {}, {}, {}, {}, {}, {}, {}, {}],
    },
  ],
  silent: [
    { name: 'reworded only', seals: 'sound', set: { 'study.title': 'Dry-weather flow' } },
    { name: 'never sealed', seals: 'none' },
  ],
});
