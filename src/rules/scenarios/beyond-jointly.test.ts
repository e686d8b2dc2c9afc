import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { scenariosBeyondJointly } from './beyond-jointly.ts';

/** Yearly values of two drivers in place of the scenario's own: wetter years were warmer during calibration. */
function twoDrivers(calibrated: readonly Year[], scenario: readonly Year[]) {
  const table = (first: number, years: readonly Year[]) =>
    `year,rain,warmth\n${years.map(([rain, warmth], place) => `${first + place},${rain},${warmth}\n`).join('')}`;
  const layout = { file: '', time: 'year', by: 'year', total: true, step: 'P1Y' };
  const source = (file: string, values: string, unit: string) => ({ ...layout, file, values, unit });
  const { by: _, total: __, ...ofDriver } = layout;
  return {
    set: {
      'scenarios.conditions': {
        wetness: source('data/calibrated-years.csv', 'rain', 'mm'),
        warmth: source('data/calibrated-years.csv', 'warmth', 'K'),
      },
      'scenarios.cases.dry.drivers': {
        wetness: { ...ofDriver, file: 'data/dry-years.csv', values: 'rain' },
        warmth: { ...ofDriver, file: 'data/dry-years.csv', values: 'warmth' },
      },
    },
    files: {
      'data/calibrated-years.csv': table(2004, calibrated),
      'data/dry-years.csv': table(2044, scenario),
    },
  };
}

type Year = readonly [rain: number, warmth: number];

const together: readonly Year[] = [
  [800, 1],
  [900, 1.9],
  [1000, 3.1],
  [1100, 4],
];
const square: readonly Year[] = [
  [800, 1],
  [1100, 1],
  [800, 4],
  [1100, 4],
];

ruleCases(scenariosBeyondJointly, {
  fires: [
    {
      name: 'dry and warm, where every dry year of calibration was cool',
      ...twoDrivers(together, [
        [850, 3.5],
        [870, 3.6],
        [860, 3.4],
      ]),
      finds: {
        record: 'scenarios.dry',
        subject: 'joint',
        level: 'warn',
        message:
          'lies inside the calibrated range of every driver, but the combination of wetness and warmth',
      },
    },
    {
      name: 'years that leave the joint domain on both sides, around a mean inside it',
      ...twoDrivers(together, [
        [850, 3.5],
        [1050, 1.5],
        [950, 2.5],
      ]),
      finds: {
        subject: 'joint',
        message: '2 of 3 years of scenario dry lie inside the calibrated range of every driver',
      },
    },
    {
      name: 'a corner outside the hull that the distance alone lets pass',
      // Beyond the triangle's long side by a fifteenth; numpy (cov, inv): distance squared 0.970 of 7.38, leverage 0.573 of 0.997.
      ...twoDrivers(
        [
          [800, 1],
          [1100, 1],
          [800, 4],
          [820, 1.2],
        ],
        [[960, 2.6]],
      ),
      finds: { subject: 'joint', message: 'In its mean' },
    },
    {
      name: 'drivers that follow from each other',
      ...twoDrivers(
        [
          [800, 1.6],
          [900, 1.8],
          [1000, 2],
          [1100, 2.2],
        ],
        [[900, 1.8]],
      ),
      finds: { subject: 'undefined', message: 'is undefined: the drivers depend on each other exactly' },
    },
  ],
  silent: [
    {
      name: 'years among the calibrated ones',
      ...twoDrivers(square, [
        [900, 2],
        [1000, 3],
        [950, 3.5],
      ]),
    },
    { name: 'a mean outside a single range, which another rule says', ...twoDrivers(together, [[600, 3]]) },
  ],
});
