import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { scaled } from '../../../tests/harness/scaled.ts';
import { soundFiles } from '../../../tests/harness/sound-files.ts';
import { scenariosBeyondRange } from './beyond-range.ts';

// Calibrated rain of the sound study: 987, 981, 1071 and 1161 mm, mean 1050; the scenario's mean is 1019 mm, its years 987 to 1081.
const rain = { record: 'scenarios.dry', subject: 'annual_rainfall', level: 'block' } as const;
const field = 'scenarios.cases.dry.drivers.annual_rainfall';

ruleCases(scenariosBeyondRange, {
  fires: [
    {
      name: 'the mean rain below the driest calibrated year',
      files: { 'data/dry-rain.csv': scaled('rain_mm', 0.9) },
      // 0.9 x 1019 = 917.1; (1019 x 0.9 - 1050) / 1050 = -12.7 %, which alone would be within -15 %
      finds: {
        ...rain,
        field,
        found: 917.1,
        unit: 'mm',
        message: '917.1 mm, lies outside the calibrated range of 981 to 1 161 mm (-12.7 %)',
        detail: [
          'years outside (7 of 7): 2044 (894.6), 2045 (896.8), 2046 (932.4), 2047 (972.9), 2048 (900.9), 2049 (888.3) and 1 more',
          'furthest: 2049 with 888.3 mm, 51.5 % of the range beyond its end',
          // Percentiles of type 7 of 981, 987, 1071, 1161: 981 + 0.3 x 6, and 1071 + 0.7 x 90
          'calibrated mean 1 050 mm of 4 years (10th to 90th percentile 982.8 to 1 134 mm); in the scenario 917.1 mm of 7 (-12.7 %)',
          'single steps: 0 % above the calibrated 99th percentile and 0 % below the 1st (1 % each if nothing changed)',
        ],
      },
    },
    {
      name: 'the mean rain above the wettest calibrated year',
      files: { 'data/dry-rain.csv': scaled('rain_mm', 1.2) },
      finds: { ...rain, message: 'lies outside the calibrated range of 981 to 1 161 mm (+16.5 %)' },
    },
    {
      name: 'mean rain inside the range, but more than 15 % below a calibration with one very dry year',
      // Calibrated: 2005 becomes 490.5 mm, so the mean 927.4; scenario 0.75 x 1019 = 764.3, -17.6 %
      files: {
        'data/rain.csv': scaled('rain_mm', 0.5, ['2004-10', '2004-11', '2004-12', '2005-0']),
        'data/dry-rain.csv': scaled('rain_mm', 0.75),
      },
      finds: {
        ...rain,
        message: 'is 17.6 % below the calibrated 927.4 mm; a calibration is trusted from -15 to +20 %',
      },
    },
    {
      name: 'single years outside, the mean inside',
      files: { 'data/dry-rain.csv': scaled('rain_mm', 0.8, ['2044-1', '2045-0']) },
      finds: {
        record: 'scenarios.dry',
        subject: 'annual_rainfall',
        level: 'warn',
        message:
          'lies outside the calibrated range of 981 to 1 161 mm in 1 of 7 years, though its mean does not',
      },
    },
    {
      name: 'a warmer scenario than any calibrated summer',
      files: { 'runs/dry/daily.csv': scaled('pet_mm', 1.1) },
      finds: { record: 'scenarios.dry', subject: 'summer_evapotranspiration', level: 'block' },
    },
    {
      name: 'land cover that was never calibrated',
      set: landCover(),
      files: { 'data/cover.csv': cover([0.3, 0.31, 0.3, 0.32]), 'data/cover-2045.csv': cover([0.5], 2045) },
      finds: {
        record: 'scenarios.dry',
        subject: 'forest_share',
        level: 'block',
        message:
          'The mean forest share of scenario dry, 0.5, lies outside the calibrated range of 0.3 to 0.32',
      },
    },
    {
      name: 'one of many climates that one fragment states',
      set: {
        'inputs.climate': {
          each: ['mild', 'dry'],
          role: 'precipitation',
          files: ['data/{each}.csv'],
          series: { time: 'date', values: 'rain_mm', unit: 'mm/d', step: 'P1D' },
        },
        'runs.climate': {
          each: ['mild', 'dry'],
          takes: ['inputs.climate.{each}'],
          simulation: '2041-10-01/2050-09-30',
        },
        'scenarios.cases': {
          climate: {
            each: ['mild', 'dry'],
            run: 'climate.{each}',
            drivers: { annual_rainfall: { input: 'climate.{each}' } },
          },
        },
      },
      files: {
        'data/mild.csv': soundFiles()['data/dry-rain.csv'] ?? '',
        'data/dry.csv': scaled('rain_mm', 0.9)(soundFiles()['data/dry-rain.csv'] ?? ''),
      },
      // The warm-up kept out is the study's, which lies in other years: nine years from 2042 to 2050.
      finds: {
        record: 'scenarios.climate.dry',
        field: 'scenarios.cases.climate.drivers.annual_rainfall',
        message: 'of scenario climate.dry',
      },
    },
    {
      name: 'before application it is a note',
      phase: 'validation',
      files: { 'data/dry-rain.csv': scaled('rain_mm', 0.9) },
      finds: { ...rain, level: 'note' },
    },
  ],
  silent: [
    {
      name: 'a scenario of the calibrated years themselves',
      set: { 'scenarios.cases.dry.drivers.annual_rainfall': { input: 'rainfall', over: 'calibration' } },
    },
    {
      name: 'land cover within what was calibrated',
      set: landCover(),
      files: { 'data/cover.csv': cover([0.3, 0.31, 0.3, 0.32]), 'data/cover-2045.csv': cover([0.31], 2045) },
    },
  ],
});

function landCover() {
  const cover = (file: string, period: string) => ({
    role: 'land_cover',
    files: [file],
    series: { time: 'year', values: 'forest', unit: '1', step: 'P1Y' },
    period,
    missing_share: 0,
  });
  return {
    'inputs.cover': cover('data/cover.csv', '2003-10-01/2007-09-30'),
    'inputs.cover-2045': cover('data/cover-2045.csv', '2044-10-01/2045-09-30'),
    'scenarios.conditions.forest_share': { input: 'cover', by: 'year', unit: '1' },
    'scenarios.cases.dry.drivers.forest_share': { input: 'cover-2045' },
  };
}

/** Forest as a share of the area, a row for each year from 2004 on unless said. */
function cover(shares: readonly number[], first = 2004): string {
  return `year,forest\n${shares.map((share, place) => `${first + place},${share}\n`).join('')}`;
}
