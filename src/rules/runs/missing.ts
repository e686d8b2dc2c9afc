import type { Facts } from '../../facts/facts.ts';
import { nodesIn } from '../../facts/nodes-in.ts';
import { fromTop } from '../../records/paths.ts';
import { type Draft, rule } from '../rule.ts';

export const runsMissing = rule({
  id: 'runs.missing',
  scope: 'manifest',
  from: 'calibration',
  means: 'incomplete',
  statement: 'A simulated file is the output of no run, or a run has no command or no environment.',
  why: 'An output that no recorded run gives can’t be made again, and nobody knows which settings it shows.',
  source: { basis: 'practice', citation: 'Common practice in reproducible modelling.' },
  clear:
    'State the run under runs with start (the command), takes, gives and, here or in the model, environment.',
  check: (_, facts) => {
    const { model } = facts.manifest.data;
    const untold = nodesIn(facts.records.nodes, 'runs').flatMap(
      ({ id, name, field, fragment: run }): readonly Draft[] => {
        const lacking = [
          run.start === undefined ? 'command (`start`)' : null,
          run.environment === undefined && model?.environment === undefined
            ? 'environment (runtime and version)'
            : null,
          run.gives === undefined ? 'outputs (`gives`)' : null,
        ].filter((one) => one !== null);
        if (lacking.length === 0) return [];
        return [{ record: id, field, message: `Run ${name} has no ${lacking.join(', no ')}.` }];
      },
    );
    return [...untold, ...outputsOfNoRun(facts)];
  },
});

function outputsOfNoRun(facts: Facts): readonly Draft[] {
  const { folder } = facts.manifest;
  const runs = nodesIn(facts.records.nodes, 'runs').map(({ name, claims, elsewhere }) => ({
    name,
    gives: new Set([
      ...[...claims.values()].filter(({ own }) => own).map(({ path }) => path),
      ...elsewhere.map(({ path }) => path),
    ]),
  }));
  const isGiven = (file: string, by: string | undefined) =>
    runs.some(({ name, gives }) => (by === undefined || name === by) && gives.has(fromTop(folder, file)));
  const uses = [
    ...nodesIn(facts.records.nodes, 'evaluation').map(({ id, field, fragment }) => ({
      record: id,
      field: [...field, 'simulated', 'file'],
      ...fragment.simulated,
    })),
    ...nodesIn(facts.records.nodes, 'balance').map(({ id, field, fragment: { run, file } }) => ({
      record: id,
      field: [...field, 'file'],
      run,
      file,
    })),
  ];
  return uses.flatMap(({ record, field, run, file }) =>
    file === undefined || isGiven(file, run)
      ? []
      : {
          record,
          field,
          subject: file,
          message: `${file} is used as a simulated result, but ${run === undefined ? 'no run says' : `run ${run} does not say`} that it gives it.`,
          ...(run !== undefined && runs.some(({ name }) => name === run)
            ? {
                clear: `Add ${file} to gives of runs.${run}, if that run made it; else name the run that did.`,
              }
            : {}),
        },
  );
}
