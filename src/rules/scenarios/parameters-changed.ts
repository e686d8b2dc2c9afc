import { few } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';

export const scenariosParametersChanged = rule({
  id: 'scenarios.parameters-changed',
  scope: 'scenarios',
  from: 'application',
  means: 'contradicted',
  statement:
    'The run of a scenario takes other parameter files or values than the calibrated run, and the scenario does not say so.',
  why: 'A difference between scenario and present is read as the effect of the drivers. With other parameters it is that of a second model.',
  source: {
    basis: 'practice',
    citation: 'Common practice: a scenario is run with the calibrated parameters.',
  },
  clear:
    'Run the scenario with the calibrated parameter file; or say under `parameters_changed` which parameters differ (`names`) and why (`because`).',
  check: ({ id, name, field, fragment }, { scenarios }) => {
    const found = scenarios.cases.get(id)?.parameters;
    if (found === undefined) return [];
    const { differing, leftOut, instead } = found;
    const { parameters_changed: said } = fragment;
    const isSaid = (parameter: string) =>
      said !== undefined && (said.names === undefined || said.names.includes(parameter));
    const drafts: Draft[] = differing
      .filter((one) => !isSaid(one.name))
      .map((one) => ({
        record: id,
        field: [...field, 'run'],
        ...(one.line === null ? {} : { file: one.file, line: one.line }),
        subject: one.name,
        ...(one.stated === null ? {} : { stated: one.stated }),
        found: one.found,
        message: `Scenario ${name} runs with ${one.name} ${one.found} (${one.file}); calibrated is ${one.stated}.`,
      }));
    if (said === undefined && differing.length === 0 && leftOut.length > 0)
      drafts.push({
        record: id,
        field: [...field, 'run'],
        subject: 'file',
        message: `The run of scenario ${name} does not take ${few(leftOut)}, where calibrated parameters stand${instead.length === 0 ? '' : ` (it takes ${few(instead)})`}, so whether it uses the same values can’t be told.`,
      });
    return drafts;
  },
});
