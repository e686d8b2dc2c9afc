import type { DossierStudy } from '../../content.ts';
import { commandLine } from '../command-line.ts';
import { filesOfRun, runsOf } from '../files-of.ts';
import { idOf } from '../identifier.ts';
import { authorsOf } from '../people.ts';
import { type Entity, type Reference, refer, referTo } from './entity.ts';
import type { FileEntities } from './file-entities.ts';

export interface RunEntities {
  readonly actions: readonly Entity[];
  /** The model, and what it runs on. */
  readonly software: readonly Entity[];
}

/**
 * An action for each run of a study. Who answers for the study stands as its agent: nobody records who started a run. Its end is
 * known to the day. Source: Process Run Crate 0.5.
 */
export function runEntities(
  study: DossierStudy,
  files: FileEntities,
  partyIds: ReadonlyMap<string, string>,
): RunEntities {
  const runs = runsOf(study);
  if (runs.length === 0) return { actions: [], software: [] };
  const software = softwareOf(study, files);
  const [model] = software;
  const agents = authorsOf(study).flatMap(({ uuid }) => refersTo(partyIds.get(uuid)));
  const actions = runs.map((run): Entity => {
    const { takes, gives } = filesOfRun(run, study);
    const entitiesOf = (paths: readonly string[]) =>
      paths.flatMap((path) => refersTo(files.byPath.get(path)?.['@id']));
    return {
      '@id': `#run-${idOf('run', study.facts.manifest.path, run.id, run.digest)}`,
      '@type': 'CreateAction',
      name: `Run ${run.name ?? run.id}`,
      description: commandLine(run.fragment),
      instrument: model === undefined ? undefined : refer(model),
      object: referTo(entitiesOf(takes)),
      result: referTo(entitiesOf(gives)),
      agent: referTo(agents),
      endTime: run.fragment.ran_on,
      actionStatus: gives.length === 0 ? undefined : { '@id': 'http://schema.org/CompletedActionStatus' },
    };
  });
  return { actions, software };
}

/** The model first, then the runtime that it needs. */
function softwareOf({ facts }: DossierStudy, files: FileEntities): readonly Entity[] {
  const { model, study } = facts.manifest.data;
  const { runtime, version } = model?.environment ?? {};
  const environment: readonly Entity[] =
    runtime === undefined
      ? []
      : [
          {
            '@id': `#software-${idOf('software', runtime, version ?? '')}`,
            '@type': 'SoftwareApplication',
            name: runtime,
            version,
          },
        ];
  const executables = [...(facts.record('model')?.claims.values() ?? [])].flatMap(({ path, own }) =>
    own ? refersTo(files.byPath.get(path)?.['@id']) : [],
  );
  const name = model?.name ?? study?.title ?? 'Model';
  const release = model?.release ?? model?.version;
  return [
    {
      '@id': `#model-${idOf('model', facts.manifest.path, name, release ?? '')}`,
      '@type': 'SoftwareApplication',
      name,
      version: release,
      url: model?.source?.url,
      datePublished: model?.released,
      hasPart: referTo(executables),
      softwareRequirements: referTo(environment),
    },
    ...environment,
  ];
}

function refersTo(id: string | undefined): readonly Reference[] {
  return id === undefined ? [] : [{ '@id': id }];
}
