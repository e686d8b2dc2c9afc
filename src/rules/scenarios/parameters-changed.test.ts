import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { scenariosParametersChanged } from './parameters-changed.ts';

const takes = (...files: string[]) => ({
  'runs.dry.takes': ['inputs.dry-climate', 'parameters', 'model/control-dry.txt', ...files],
});
const dryer =
  'name value\nsoil_capacity 140\nevaporation_factor 0.9\nsnow_threshold 0.9\nquick_recession 4\ngroundwater_recession 70\n';

ruleCases(scenariosParametersChanged, {
  fires: [
    {
      name: 'another parameter file with another value',
      set: takes('model/parameters-dry.txt'),
      files: { 'model/parameters-dry.txt': dryer },
      finds: {
        record: 'scenarios.dry',
        level: 'block',
        subject: 'soil_capacity',
        file: 'model/parameters-dry.txt',
        line: 2,
        stated: 180,
        found: 140,
        message: 'runs with soil_capacity 140 (model/parameters-dry.txt); calibrated is 180',
      },
    },
    {
      name: 'the change said of another parameter',
      set: {
        ...takes('model/parameters-dry.txt'),
        'scenarios.cases.dry.parameters_changed': {
          names: ['quick_recession'],
          because: 'drains were cleared',
        },
      },
      files: { 'model/parameters-dry.txt': dryer },
      finds: { subject: 'soil_capacity' },
    },
    {
      name: 'a parameter file that can’t be read alike',
      set: takes('model/parameters-dry.bin'),
      files: { 'model/parameters-dry.bin': '\u0001\u0002' },
      finds: {
        subject: 'file',
        message:
          'does not take model/parameters.txt, where calibrated parameters stand (it takes model/parameters-dry.bin)',
      },
    },
    {
      name: 'no parameter file at all',
      set: takes(),
      finds: { subject: 'file', message: 'whether it uses the same values can’t be told' },
    },
  ],
  silent: [
    {
      name: 'the change is said',
      set: {
        ...takes('model/parameters-dry.txt'),
        'scenarios.cases.dry.parameters_changed': { names: ['soil_capacity'], because: 'ploughed deeper' },
      },
      files: { 'model/parameters-dry.txt': dryer },
    },
    {
      name: 'another file with the same values',
      set: takes('model/parameters-copy.txt'),
      files: { 'model/parameters-copy.txt': dryer.replace('140', '180') },
    },
  ],
});
