import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { scenariosForcingUnsourced } from './forcing-unsourced.ts';

ruleCases(scenariosForcingUnsourced, {
  fires: [
    {
      name: 'a driver measured on an input that the run does not take',
      set: { 'scenarios.cases.dry.drivers.annual_rainfall.input': 'rainfall' },
      finds: {
        record: 'scenarios.dry',
        level: 'block',
        subject: 'annual_rainfall',
        field: 'scenarios.cases.dry.drivers.annual_rainfall.input',
        message: 'run dry does not take it',
      },
    },
    {
      name: 'a forcing file that is no input record',
      set: {
        'runs.dry.takes': [
          'data/dry-rain.csv',
          'parameters',
          'model/control-dry.txt',
          'model/parameters.txt',
        ],
        'scenarios.cases.dry.drivers.annual_rainfall': {
          run: 'dry',
          file: 'runs/dry/daily.csv',
          time: 'date',
          values: 'rain_mm',
        },
      },
      finds: { subject: 'run', message: 'takes no input record that holds these days' },
    },
    {
      name: 'a run that takes the present climate only, for other years',
      set: {
        'runs.dry.takes': ['inputs.rainfall', 'parameters'],
        'scenarios.cases.dry.drivers': {
          annual_rainfall: { run: 'dry', file: 'runs/dry/daily.csv', time: 'date', values: 'rain_mm' },
        },
      },
      finds: { subject: 'run', message: '2041-10-01 to 2050-09-30' },
    },
  ],
  silent: [
    {
      name: 'a management scenario with the present climate',
      set: {
        'runs.dry.takes': ['inputs.rainfall', 'parameters'],
        'runs.dry.simulation': '2001-10-01/2010-09-30',
        'scenarios.cases.dry.drivers': { annual_rainfall: { input: 'rainfall' } },
      },
    },
  ],
});
