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
  /** Values in files that only the scenario's run takes, where they are not the calibrated ones. */
  readonly differing: readonly ChangedParameter[];
  /** Parameter files of the calibrated run that the scenario's does not take, and whose values stand in no other file that it takes; from the top of the repository. */
  readonly leftOut: readonly string[];
  /** Files called like parameter files that only the scenario's run takes. */
  readonly instead: readonly string[];
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
  const none = { differing: [], leftOut: [], instead: [] };
  const run = records.nodes.get(`runs.${fragment.run}`) as RecordNode<'runs'> | undefined;
  const calibrated = calibratedRuns(records).filter(({ id }) => id !== run?.id);
  if (run === undefined || calibrated.length === 0) return none;
  const own = filesTaken(run);
  const theirs = new Set(calibrated.flatMap((one) => [...filesTaken(one)]));
  const readings = parameterReadings(records).filter(({ file }) => theirs.has(file));
  const more = [...own].filter((path) => !theirs.has(path));
  const differing: ChangedParameter[] = [];
  const standsIn = new Map<string, boolean>();
  for (const { name, value, reading, file } of readings) {
    let isFound = false;
    for (const path of more) {
      const content = await snapshot.read(path, largestBytes);
      const taken = content === null ? '' : take(content, reading.take, path);
      const compared =
        typeof taken === 'string'
          ? ''
          : compare(taken.value, value, { as: reading.as, from: undefined, to: undefined });
      if (typeof taken === 'string' || typeof compared === 'string') continue;
      isFound = true;
      const { stated, found, agrees } = compared;
      if (!agrees) differing.push({ name, file: path, line: taken.line, stated, found });
    }
    standsIn.set(file, isFound && standsIn.get(file) !== false);
  }
  const called = (paths: Iterable<string>) => [...paths].filter((path) => named.test(basename(path)));
  const known = new Set([...standsIn.keys(), ...called(theirs)]);
  return {
    differing,
    leftOut: [...known].filter((path) => !own.has(path) && standsIn.get(path) !== true),
    instead: called(more),
  };
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
