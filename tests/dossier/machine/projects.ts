import { cpSync, mkdirSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { gather } from '../../../src/commands/gather.ts';
import type { DossierContent, DossierFile } from '../../../src/dossier/content.ts';
import { payloadPath } from '../../../src/dossier/layout.ts';
import { crateDocument, machineDocuments } from '../../../src/dossier/machine/index.ts';
import { type Payload, payloadOf } from '../../../src/dossier/payload.ts';
import { stoplog } from '../../harness/command.ts';
import { gitIn, type TemporaryRepository, temporaryRepository } from '../../harness/repository.ts';
import { soundFiles } from '../../harness/sound-files.ts';
import { manifestText } from '../../harness/study.ts';

/** A committed project with the documents that its dossier has for programs. */
export interface Project {
  readonly repository: TemporaryRepository;
  readonly content: DossierContent;
  readonly payload: Payload;
  /** All but the crate's. */
  readonly documents: readonly DossierFile[];
  readonly crate: DossierFile;
  text(name: string): string;
  json(name: string): Json;
}

/** What JSON may hold, for tests that look into it. */
// biome-ignore lint/suspicious/noExplicitAny: a test reaches into documents whose shape it is there to find out.
export type Json = any;

async function projectOf(repository: TemporaryRepository): Promise<Project> {
  const context = {
    cwd: repository.folder,
    environment: repository.environment,
    today: '2030-01-01',
    color: false,
    write: () => {},
    tell: () => {},
    progress: () => {},
  };
  return gather(context, 'HEAD', async ({ content }) => {
    if (content === null) throw new Error('a manifest can’t be read');
    const payload = await payloadOf(content);
    const documents = machineDocuments(content);
    const crate = crateDocument(content, payload, documents);
    const text = (name: string) => {
      const file = [...documents, crate].find(({ path }) => path === name);
      if (file === undefined) throw new Error(`there is no ${name}`);
      return String(file.content);
    };
    return { repository, content, payload, documents, crate, text, json: (name) => JSON.parse(text(name)) };
  });
}

/** The example project in a repository of its own, with further files. */
export async function exampleProject(more: Record<string, string> = {}): Promise<TemporaryRepository> {
  const repository = await temporaryRepository();
  cpSync(join(import.meta.dirname, '../../../example-project'), repository.folder, { recursive: true });
  for (const [path, content] of Object.entries(more)) await repository.write(path, content);
  await commitAll(repository);
  return repository;
}

const lfsPointer = `version https://git-lfs.github.com/spec/v1
oid sha256:${'4d'.repeat(32)}
size 123456
`;

/** Names that need care in one format or another. Control characters, markup and scripts stand in texts. */
export const awkwardNames = {
  rain: 'data/rain gauge 50% #1 (a), [b]; c=d&e.csv',
  flow: 'data/Πηνειός/流量 – Ærø.csv',
  output: 'runs/calibrated/extra\nline "quoted" %0A.csv',
  lfs: 'data/large file.nc',
};

export async function awkwardProject(): Promise<TemporaryRepository> {
  const { 'data/rain.csv': rain = '', 'data/flow.csv': flow = '', ...files } = soundFiles();
  const given = {
    role: 'other',
    source: { provider: 'Office', title: 'Grid', doi: '10.5072/radar(1)<b>', licence: 'CC0-1.0' },
  };
  const text = manifestText({
    set: {
      'study.title': 'Harrow "Brook": \u0007 <script>alert(1)</script> & \u202eμ\n- second: line #3',
      'study.licence': 'CC-BY-3.0-AU',
      'study.contacts': [
        {
          name: 'Åse Ødegård, Dr: "the" #1',
          role: 'modeller',
          orcid: '0000-0002-1825-0097',
          affiliation: 'Eastmoor Rivers Office',
        },
        { name: 'Eastmoor Rivers Office', role: 'owner', email: 'models@eastmoor.example' },
        { name: '水文 太郎' },
      ],
      'study.literature': [
        { cites: 'A {paper} with & < signs', doi: 'https://doi.org/10.5072/a(b)<c>' },
        { cites: 'Another, without an address' },
      ],
      'inputs.rainfall.files': [awkwardNames.rain],
      'inputs.streamflow.files': [awkwardNames.flow],
      'inputs.lfs': { ...given, files: [awkwardNames.lfs] },
      'inputs.fetched': {
        ...given,
        stored: 'elsewhere',
        files: [
          {
            path: 'radar/a b%20c.nc',
            sha256: 'ab'.repeat(32),
            bytes: 17,
            location: 'https://data.eastmoor.example/radar/a b.nc?x=1|2',
          },
        ],
      },
      'inputs.shelved': {
        ...given,
        stored: 'elsewhere',
        files: [{ path: 'radar/old.nc', sha256: 'cd'.repeat(32), location: 'shelf 7, box "B"' }],
      },
      'runs.calibrated.takes': [
        'inputs.rainfall',
        'inputs.temperature',
        'inputs.fetched',
        'inputs.shelved',
        'parameters',
        'model/control.txt',
        'model/parameters.txt',
      ],
      'runs.calibrated.start': ['node', 'model/model.mjs', "it's", 'a\\b', 'two\nlines'],
      'runs.calibrated.ran_on': '2021-01-10',
    },
  });
  const repository = await temporaryRepository();
  const all = {
    ...files,
    [awkwardNames.rain]: rain,
    [awkwardNames.flow]: flow,
    [awkwardNames.output]: 'date,value\n',
    [awkwardNames.lfs]: lfsPointer,
    'stoplog.yaml': text,
  };
  for (const [path, content] of Object.entries(all)) await repository.write(path, content);
  await commitAll(repository);
  const sealed = await stoplog(repository.folder, ['seal', '--all'], '2021-02-01');
  if (sealed.status === 2) throw sealed.failure ?? new Error(sealed.text);
  await commitAll(repository);
  return repository;
}

/** With dates of their own, so that the same files give the same commit. */
async function commitAll({ folder }: TemporaryRepository): Promise<void> {
  const date = '2025-03-12T10:00:00+0100';
  const git = gitIn(folder, { GIT_AUTHOR_DATE: date, GIT_COMMITTER_DATE: date });
  await git('add', '--all');
  await git('commit', '--quiet', '--message', 'A state');
}

/** Writes a bag's payload as far as a crate speaks of it: documents, and files of the repository with any content. */
export function writeCrate(folder: string, { documents, crate, payload }: Project, crateText?: string): void {
  const write = (path: string, content: string | Uint8Array) => {
    mkdirSync(dirname(join(folder, path)), { recursive: true });
    writeFileSync(join(folder, path), content);
  };
  for (const { path, content } of documents) write(path, content);
  for (const { path } of payload.files) write(payloadPath(path), '');
  write(crate.path, crateText ?? crate.content);
}

let example: Promise<Project> | undefined;
let awkward: Promise<Project> | undefined;

/** Made once for all test files: documents are all that they look at. */
export function theExample(): Promise<Project> {
  example ??= exampleProject().then(readAndRemoved);
  return example;
}

export function theAwkward(): Promise<Project> {
  awkward ??= awkwardProject().then(readAndRemoved);
  return awkward;
}

export async function readAndRemoved(repository: TemporaryRepository): Promise<Project> {
  const project = await projectOf(repository);
  await repository.remove();
  return project;
}
