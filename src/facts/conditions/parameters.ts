import { basename } from 'node:path/posix';
import { resolvePattern } from '../../records/find-paths.ts';
import type { RecordNode, Records } from '../../records/record.ts';
import type { Snapshot } from '../../repository/snapshot.ts';
import { compare } from '../compare.ts';
import { nodesIn } from '../nodes-in.ts';
import { take } from '../take.ts';
import { runOf } from '../windows.ts';

/** How the parameters of a scenario's run stand to the calibrated ones. */
export interface CaseParameters {
  /** Parameter files that the calibrated run takes and the scenario's does not, from the top of the repository. */
  readonly leftOut: readonly string[];
  /** Files that only the scenario's run takes and in which a parameter, or by its name all of them, may stand. */
  readonly instead: readonly string[];
  /** Values in those that are not the calibrated ones. */
  readonly differing: readonly ChangedParameter[];
  /** Parameters of the files left out that stand in none of the others. */
  readonly untold: readonly string[];
}

export interface ChangedParameter {
  readonly name: string;
  readonly file: string;
  readonly line: number | null;
  readonly stated: number | string | null;
  readonly found: number | string;
}

/** A file that is called so holds parameters, also where no reading says it. */
const named = /param/i;

/** Parameter files are small. */
const largestBytes = 16 * 2 ** 20;

/** Compares the parameter files that a scenario's run takes with those of the evaluated runs; a run of a differential split-sample test is none of these. */
export async function caseParameters(
  { fragment }: RecordNode<'scenarios'>,
  records: Records,
  snapshot: Snapshot,
): Promise<CaseParameters> {
  const none = { leftOut: [], instead: [], differing: [], untold: [] };
  const run = records.nodes.get(`runs.${fragment.run}`) as RecordNode<'runs'> | undefined;
  const calibrated = calibratedRuns(records).filter(({ id }) => id !== run?.id);
  if (run === undefined || calibrated.length === 0) return none;
  const own = filesTaken(run);
  const theirs = new Set(calibrated.flatMap((one) => [...filesTaken(one)]));
  const readings = parameterReadings(records).filter(({ file }) => theirs.has(file));
  const known = new Set([
    ...readings.map(({ file }) => file),
    ...[...theirs].filter((path) => named.test(basename(path))),
  ]);
  const leftOut = [...known].filter((path) => !own.has(path));
  const more = [...own].filter((path) => !theirs.has(path));
  const differing: ChangedParameter[] = [];
  const untold: string[] = [];
  const read = new Set<string>();
  for (const { name, value, reading, file } of readings) {
    const found: boolean[] = [];
    for (const path of more) {
      const content = await snapshot.read(path, largestBytes);
      const taken = content === null ? '' : take(content, reading.take, path);
      if (typeof taken === 'string') continue;
      const compared = compare(taken.value, value, { as: reading.as, from: undefined, to: undefined });
      if (typeof compared === 'string') continue;
      read.add(path);
      found.push(true);
      const { stated } = compared;
      if (!compared.agrees)
        differing.push({ name, file: path, line: taken.line, stated, found: compared.found });
    }
    if (found.length === 0 && leftOut.includes(file)) untold.push(name);
  }
  const instead = more.filter((path) => read.has(path) || named.test(basename(path)));
  return { leftOut, instead, differing, untold };
}

/** Runs that a target is evaluated by with the calibrated parameters. */
function calibratedRuns({ nodes }: Records): readonly RecordNode<'runs'>[] {
  return nodesIn(nodes, 'evaluation').flatMap((target) => {
    const { split_test } = target.fragment;
    return split_test === 'differential' || split_test === 'differential_proxy_basin'
      ? []
      : (runOf(target, nodes) ?? []);
  });
}

function filesTaken({ claims, field }: RecordNode<'runs'>): ReadonlySet<string> {
  const taken = [...claims.values()].filter((claim) => claim.field[field.length] === 'takes');
  return new Set(taken.map(({ path }) => path));
}

/** Readings of parameter values, with the value that the record states. */
function parameterReadings({ manifest, nodes }: Records) {
  const parameters = nodes.get('parameters') as RecordNode<'parameters'> | undefined;
  return (manifest.data.readings ?? []).flatMap((reading) => {
    const name = reading.of.startsWith('parameters.') ? reading.of.slice('parameters.'.length) : '';
    const stated = parameters?.fragment.values?.find((one) => one.name === name);
    const place = resolvePattern(manifest.folder, reading.file);
    return stated === undefined || place === null
      ? []
      : [{ name, value: stated.value, reading, file: place.root + place.rest }];
  });
}
