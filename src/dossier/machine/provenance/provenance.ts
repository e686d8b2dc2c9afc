import { isDate } from '../../../manifest/period.ts';
import type { RecordNode } from '../../../records/record.ts';
import type { Seal } from '../../../records/seal.ts';
import type { DossierContent, DossierStudy } from '../../content.ts';
import { commandLine } from '../command-line.ts';
import { filesElsewhere, filesOfRun, recordedFiles, runsOf, sealedPath } from '../files-of.ts';
import { idOf } from '../identifier.ts';
import { type Party, sealerOf } from '../people.ts';
import { count, day, Statements, typed } from './statements.ts';

const prefix = {
  id: 'urn:uuid:',
  stoplog: 'urn:stoplog:terms:1:',
  foaf: 'http://xmlns.com/foaf/0.1/',
};

/**
 * `prov.json`: the runs with the files that went in and came out, the sealing of records by people, and the check by Stoplog.
 * PROV-JSON (W3C Member Submission, 24 April 2013). Runs and seals are known to the day: such an activity starts with it and
 * ends with it, UTC, and says the day in `stoplog:day`; what it generated is there at its end.
 */
export function provenance(content: DossierContent): object {
  const statements = new Statements();
  const files = fileEntities(content, statements);
  const made = new Set<string>();
  for (const study of content.studies) {
    for (const run of runsOf(study)) stateRun(run, study, files, made, statements);
    for (const [record, { seal }] of study.facts.standings)
      if (seal !== null) stateSeal(record, seal, study, statements);
  }
  stateCheck(content, files, statements);
  return { prefix, ...statements.grouped() };
}

/** Files as they are now, in git and elsewhere: identifier by path. */
function fileEntities(content: DossierContent, statements: Statements): ReadonlyMap<string, string> {
  const inGit = recordedFiles(content).map(
    ({ path, sha256, bytes }) => [path, stateFile(path, sha256, bytes, statements)] as const,
  );
  const elsewhere = [...filesElsewhere(content).values()].map(
    ({ path, sha256, bytes }) => [path, stateFile(path, sha256 ?? null, bytes ?? null, statements)] as const,
  );
  return new Map([...elsewhere, ...inGit]);
}

/** Another content at the same path is another entity. */
function stateFile(
  path: string,
  sha256: string | null,
  bytes: number | null,
  statements: Statements,
): string {
  return statements.add('entity', idOf('file', path, sha256 ?? ''), {
    'prov:label': path,
    'prov:type': typed('stoplog:File'),
    'stoplog:path': path,
    ...(sha256 === null ? {} : { 'stoplog:sha256': sha256 }),
    ...(bytes === null ? {} : { 'stoplog:bytes': count(bytes) }),
  });
}

function stateRun(
  run: RecordNode<'runs'>,
  study: DossierStudy,
  files: ReadonlyMap<string, string>,
  made: Set<string>,
  statements: Statements,
): void {
  const activity = statements.add('activity', idOf('run', study.facts.manifest.path, run.id, run.digest), {
    ...wholeDay(run.fragment.ran_on),
    'prov:type': typed('stoplog:ModelRun'),
    'prov:label': run.id,
  });
  const { takes, gives } = filesOfRun(run, study);
  const entities = (paths: readonly string[]) => paths.flatMap((path) => files.get(path) ?? []);
  const taken = entities(takes);
  for (const entity of taken) statements.relate('used', { 'prov:activity': activity, 'prov:entity': entity });
  const source = stateTogether(run, taken, statements);
  // A file has one origin only: where two runs claim it, it is the first one's.
  for (const entity of entities(gives).filter((given) => !made.has(given))) {
    made.add(entity);
    const end = atEnd(run.fragment.ran_on);
    statements.relate('wasGeneratedBy', { 'prov:entity': entity, 'prov:activity': activity, ...end });
    if (source !== null)
      statements.relate('wasDerivedFrom', { 'prov:generatedEntity': entity, 'prov:usedEntity': source });
  }
  stateModel(run, activity, study, statements);
}

/** All that a run takes as one entity, for each output comes from all of it; null where it takes nothing. */
function stateTogether(
  { id }: RecordNode<'runs'>,
  members: readonly string[],
  statements: Statements,
): string | null {
  if (members.length === 0) return null;
  const together = statements.add('entity', idOf('together', ...members), {
    'prov:type': typed('prov:Collection'),
    'prov:label': `What ${id} takes`,
  });
  for (const member of members)
    statements.relate('hadMember', { 'prov:collection': together, 'prov:entity': member });
  return together;
}

/** The model ran by its command. */
function stateModel(
  run: RecordNode<'runs'>,
  activity: string,
  { facts }: DossierStudy,
  statements: Statements,
): void {
  const { model } = facts.manifest.data;
  const name = model?.name ?? 'model';
  const release = model?.release ?? model?.version ?? '';
  const agent = statements.add('agent', idOf('model', facts.manifest.path, name, release), {
    'prov:type': typed('prov:SoftwareAgent'),
    'prov:label': `${name} ${release}`.trim(),
  });
  const command = commandLine(run.fragment);
  const plan =
    command === undefined
      ? {}
      : {
          'prov:plan': statements.add('entity', idOf('command', command), {
            'prov:type': typed('prov:Plan'),
            'prov:label': command,
          }),
        };
  statements.relate('wasAssociatedWith', { 'prov:activity': activity, 'prov:agent': agent, ...plan });
}

/** A person looked at a record and its files as they were then, and sealed it. */
function stateSeal(record: string, seal: Seal, study: DossierStudy, statements: Statements): void {
  const { path } = study.facts.manifest;
  const activity = statements.add('activity', idOf('sealing', path, record, seal.checksum), {
    ...wholeDay(seal.sealed_on),
    'prov:type': typed('stoplog:Sealing'),
    'prov:label': `Sealing of ${record}`,
    ...(seal.because === null ? {} : { 'stoplog:because': seal.because }),
  });
  const entity = statements.add('entity', idOf('seal', path, record, seal.checksum), {
    'prov:type': typed('stoplog:Seal'),
    'prov:label': `Seal of ${record}`,
    'stoplog:digest': seal.digest,
    'stoplog:grade': seal.grade,
  });
  const agent = stateParty(sealerOf(seal.sealed_by), statements);
  statements.relate('wasAssociatedWith', { 'prov:activity': activity, 'prov:agent': agent });
  statements.relate('wasAttributedTo', { 'prov:entity': entity, 'prov:agent': agent });
  statements.relate('wasGeneratedBy', {
    'prov:entity': entity,
    'prov:activity': activity,
    ...atEnd(seal.sealed_on),
  });
  for (const [name, { sha256, bytes }] of Object.entries(seal.files)) {
    if (sha256 === null) continue;
    const file = stateFile(sealedPath(study, name), sha256, bytes, statements);
    statements.relate('used', { 'prov:activity': activity, 'prov:entity': file });
  }
}

/** Whoever sealed acts as a person, whatever the name. */
function stateParty({ uuid, name, email }: Party, statements: Statements): string {
  return statements.add('agent', uuid, {
    'prov:type': typed('prov:Person'),
    'foaf:name': name,
    ...(email === undefined ? {} : { 'foaf:mbox': `mailto:${email}` }),
  });
}

/** Stoplog read the files as they are in the commit. When it did so is not told: the same commit gives the same bytes. */
function stateCheck(
  content: DossierContent,
  files: ReadonlyMap<string, string>,
  statements: Statements,
): void {
  const { commit, madeBy, verdict } = content;
  const tool = statements.add('agent', idOf('stoplog', madeBy), {
    'prov:type': typed('prov:SoftwareAgent'),
    'prov:label': `Stoplog ${madeBy}`,
  });
  const activity = statements.add('activity', idOf('check', commit, madeBy), {
    'prov:type': typed('stoplog:Check'),
    'prov:label': `Check of commit ${commit}`,
  });
  const entity = statements.add('entity', idOf('verdict', commit, madeBy), {
    'prov:type': typed('stoplog:Verdict'),
    'prov:label': `Verdict on commit ${commit}: ${verdict.verdict}`,
  });
  statements.relate('wasAssociatedWith', { 'prov:activity': activity, 'prov:agent': tool });
  statements.relate('wasGeneratedBy', { 'prov:entity': entity, 'prov:activity': activity });
  for (const { path, isHere } of recordedFiles(content)) {
    const file = files.get(path);
    if (isHere && file !== undefined)
      statements.relate('used', { 'prov:activity': activity, 'prov:entity': file });
  }
}

function wholeDay(date: string | undefined): object {
  if (date === undefined || !isDate(date)) return {};
  return {
    'prov:startTime': `${date}T00:00:00Z`,
    'prov:endTime': endOf(date),
    'stoplog:day': day(date),
  };
}

function atEnd(date: string | undefined): object {
  return date === undefined || !isDate(date) ? {} : { 'prov:time': endOf(date) };
}

function endOf(date: string): string {
  return `${date}T23:59:59Z`;
}
