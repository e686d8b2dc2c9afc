import type { Facts } from '../../facts/facts.ts';
import type { FieldPath } from '../../manifest/manifest.ts';
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
    const { runs, model } = facts.manifest.data;
    const untold = Object.entries(runs ?? {}).flatMap(([name, run]): readonly Draft[] => {
      const lacking = [
        run.start === undefined ? 'command (`start`)' : null,
        run.environment === undefined && model?.environment === undefined
          ? 'environment (runtime and version)'
          : null,
        run.gives === undefined ? 'outputs (`gives`)' : null,
      ].filter((one) => one !== null);
      if (lacking.length === 0) return [];
      return [
        {
          record: `runs.${name}`,
          field: ['runs', name],
          message: `Run ${name} has no ${lacking.join(', no ')}.`,
        },
      ];
    });
    return [...untold, ...outputsOfNoRun(facts)];
  },
});

interface Use {
  readonly record: string;
  readonly field: FieldPath;
  readonly run: string | undefined;
  readonly file: string | undefined;
}

function outputsOfNoRun({ manifest, records }: Facts): readonly Draft[] {
  const { evaluation, balance } = manifest.data;
  const uses: readonly Use[] = [
    ...Object.entries(evaluation ?? {}).map(([name, { simulated }]) => ({
      record: `evaluation.${name}`,
      field: ['evaluation', name, 'simulated'],
      run: simulated?.run,
      file: simulated?.file,
    })),
    ...Object.entries(balance ?? {}).map(([name, { run, file }]) => ({
      record: `balance.${name}`,
      field: ['balance', name],
      run,
      file,
    })),
  ];
  const given = new Set(
    [...records.nodes.values()]
      .filter(({ area }) => area === 'runs')
      .flatMap(({ claims, elsewhere }) => [
        ...[...claims.values()].filter(({ own }) => own).map(({ path }) => path),
        ...elsewhere.map(({ path }) => path),
      ]),
  );
  const full = (file: string) => (manifest.folder === '' ? file : `${manifest.folder}/${file}`);
  return uses.flatMap(({ record, field, run, file }) =>
    file === undefined || given.has(full(file)) || given.has(file)
      ? []
      : [
          {
            record,
            field: [...field, 'file'],
            subject: file,
            message: `${file} is used as a simulated result, but ${run === undefined ? 'no run says' : `run ${run} does not say`} that it gives it.`,
          },
        ],
  );
}
