import { spawnSync } from 'node:child_process';
import { cpSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { gzipSync } from 'node:zlib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Verdict } from '../../src/verdict/finding.ts';
import { cleanEnvironment, type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';
import { multitool, saidByMultitool } from './multitool.ts';
import { obeyedIn } from './runner.ts';
import { gitlabJudge, junitJudge, junitSchema, sarifJudge, sarifSchema } from './validators.ts';
import { hostileTexts } from './verdicts.ts';

const bundle = resolve('dist/stoplog.mjs');
const rain = 'data/rain/high-tarrow.csv';

/** The example after two commits: of three faults one is in both, one is cured and one is waived by the second, which also edits a rain file. */
async function exampleProject(): Promise<TemporaryRepository> {
  const repository = await temporaryRepository();
  const { folder, git } = repository;
  cpSync(resolve('example-project'), folder, { recursive: true });
  const edit = (path: string, change: (text: string) => string) =>
    writeFileSync(join(folder, path), change(readFileSync(join(folder, path), 'utf8')));
  edit('stoplog.yaml', (text) =>
    text
      .replace(/^ {2}release: .*\n/m, '')
      .replace(/^ {4}role: owner.*\n/m, '')
      .replace(/^ {6}licence: .*\n/m, ''),
  );
  await git('add', '--all');
  await git('commit', '--quiet', '--message', 'Faults that stand');
  edit(rain, (text) => text.replace(/^(2003-02-1\d),.*$/m, '$1,55'));
  edit('stoplog.yaml', (text) =>
    text
      .replace('  version: "1.4"\n', '  version: "1.4"\n  release: "1.4.2"\n')
      .replace(
        'departures:\n',
        'departures:\n  - {rule: evaluation.drop, now: notes, because: "a drop | is `known`", by: A, on: 2025-01-10}\n',
      )
      .concat(
        'waivers:\n  - {rule: seal.stale, record: inputs.rainfall, because: "gauge | moved", by: "Office <a@b.example>", until: 2027-01-31}\n',
      ),
  );
  await git('commit', '--quiet', '--all', '--message', 'Work');
  return repository;
}

/** A thousand gauges of which nothing is said. */
async function manyFindings(): Promise<TemporaryRepository> {
  const names = Array.from({ length: 1000 }, (_, index) => `g${index}`);
  const manifest = [
    'stoplog: 1',
    'study: {id: many, title: Many gauges, phase: application}',
    'inputs:',
    ...names.map((name) => `  ${name}: {role: precipitation, files: [data/${name}.csv]}`),
  ].join('\n');
  const tables = names.map(
    (name, index) => [`data/${name}.csv`, `date,rain\n2001-01-01,${index}\n`] as const,
  );
  return temporaryRepository({ 'stoplog.yaml': `${manifest}\n`, ...Object.fromEntries(tables) });
}

/** The hostile texts as title, units, names of files, cells, reasons and persons; with `keys` also as names of records. */
async function hostileProject(keys: boolean): Promise<TemporaryRepository> {
  const repository = await temporaryRepository();
  const texts = [...hostileTexts, 'x'.repeat(240)].map((text) =>
    text.replaceAll('\ud800', '').replaceAll('\0', ''),
  );
  const fileOf = (text: string) => `data/${text.replaceAll('/', '_')}.csv`;
  const nameOf = (text: string, index: number) => (keys ? text : `g${index}`);
  mkdirSync(join(repository.folder, 'data'));
  for (const text of texts)
    writeFileSync(
      join(repository.folder, fileOf(text)),
      `date,rain\n2001-01-01,1\n2001-01-02,${JSON.stringify(text)}\n`,
    );
  // A name that is no UTF-8.
  writeFileSync(
    Buffer.concat([Buffer.from(`${repository.folder}/data/::error::`), Buffer.from([0xff, 0xfe])]),
    'a\n',
  );
  const series = { time: 'date', values: 'rain', unit: 'mm/d' };
  const inputs = texts.map((text, index) => [
    nameOf(text, index),
    {
      role: 'precipitation',
      files: [fileOf(text)],
      series: { ...series, unit: index % 2 ? text : 'mm/d' },
      source: { provider: text },
    },
  ]);
  const manifest = {
    stoplog: 1,
    study: { id: 'hostile', title: texts.join(' '), purpose: texts.join('\n'), phase: 'application' },
    inputs: Object.fromEntries(inputs),
    covers: ['**'],
    departures: texts.map((because) => ({
      rule: 'inputs.licence-missing',
      now: 'blocks',
      because,
      by: because,
      on: '2025-01-01',
    })),
    waivers: texts.map((because, index) => ({
      ...{ rule: 'inputs.retrieved-missing', record: `inputs.${nameOf(because, index)}` },
      ...{ because, by: because, until: '2027-01-31' },
    })),
  };
  // JSON is YAML, but for controls and halves of pairs, which JSON writes as escapes.
  await repository.write('stoplog.yaml', JSON.stringify(manifest, null, 2));
  await repository.git('add', '--all');
  await repository.git('commit', '--quiet', '--message', 'First state');
  await repository.write('data/more.csv', '::error::mine\n');
  await repository.git('add', '--all');
  await repository.git('commit', '--quiet', '--message', 'Second state');
  return repository;
}

const kinds = ['text', 'json', 'sarif', 'junit', 'github', 'gitlab', 'markdown'] as const;
type Kind = (typeof kinds)[number];

interface Ran {
  readonly status: number | null;
  readonly stdout: string;
  readonly stderr: string;
}

function spawned(folder: string, words: readonly string[], surroundings: NodeJS.ProcessEnv = {}): Ran {
  const env = cleanEnvironment({
    SOURCE_DATE_EPOCH: String(Date.UTC(2026, 2, 1) / 1000),
    ...surroundings,
  });
  return spawnSync(process.execPath, [bundle, ...words], {
    cwd: folder,
    env,
    encoding: 'utf8',
    maxBuffer: 1e8,
  });
}

const check = (folder: string, words: readonly string[], surroundings?: NodeJS.ProcessEnv): Ran =>
  spawned(folder, ['check', ...words], surroundings);

describe.each([
  ['the example', exampleProject, ['--base', 'HEAD~1'], 5],
  ['3 000 findings', manyFindings, [], 3000],
  ['hostile names', () => hostileProject(false), ['--base', 'HEAD~1'], 50],
  ['hostile keys', () => hostileProject(true), [], 5],
] as const)('reports as a user runs it: %s', { timeout: 300_000 }, (_name, make, words, atLeast) => {
  let repository: TemporaryRepository;
  let out: string;
  let ran: Ran;
  let reports: Readonly<Record<Kind, string>>;
  let verdict: Verdict;
  const given = [...words, '--at', 'HEAD'];
  beforeAll(async () => {
    repository = await make();
    out = await mkdtemp(join(tmpdir(), 'stoplog-out-'));
    ran = check(
      repository.folder,
      [
        ...given,
        ...kinds.flatMap((kind) => ['--report', `${kind}=${join(out, kind)}`]),
        '--report',
        'text',
        '--report',
        'github',
      ],
      {
        GITHUB_ACTIONS: 'true',
        GITLAB_CI: 'true',
        GITHUB_STEP_SUMMARY: join(out, 'summary'),
        GITHUB_OUTPUT: join(out, 'outputs'),
      },
    );
    const read = await Promise.all(
      kinds.map(async (kind) => [kind, await readFile(join(out, kind), 'utf8')]),
    );
    reports = Object.fromEntries(read);
    verdict = JSON.parse(reports.json);
  }, 300_000);
  afterAll(async () => {
    await repository.remove();
    await rm(out, { recursive: true });
  });

  it('ends with its status and says nothing beside', () => {
    expect(ran).toMatchObject({ status: 1, stderr: '' });
    expect(verdict.manifests.flatMap(({ findings }) => findings).length).toBeGreaterThanOrEqual(atLeast);
    expect(ran.stdout).toBe(reports.text + reports.github);
  });

  it('is obeyed by no host but for annotations of its own, ten of a kind', () => {
    for (const kind of kinds) if (kind !== 'github') expect.soft(obeyedIn(reports[kind]), kind).toEqual([]);
    const obeyed = obeyedIn(ran.stdout);
    expect(obeyed).not.toEqual([]);
    for (const { command, properties } of obeyed) {
      expect(['error', 'warning', 'notice']).toContain(command);
      expect(properties.title).toMatch(/^(?:stoplog$|(?:standing: |answered for: )?[\w. -]+ \([\w.-]+\)$)/);
    }
    for (const kind of ['error', 'warning', 'notice'])
      expect(obeyed.filter(({ command }) => command === kind).length).toBeLessThanOrEqual(10);
  });

  it('keeps every limit of the hosts', async () => {
    const bytes = async (file: string) => (await readFile(join(out, file))).length;
    expect(reports.markdown.length).toBeLessThanOrEqual(65_536);
    expect(await bytes('summary')).toBeLessThanOrEqual(2 ** 20);
    expect(await bytes('outputs')).toBeLessThanOrEqual(1e6);
    expect(await bytes('junit')).toBeLessThanOrEqual(30e6);
    expect(gzipSync(reports.sarif).length).toBeLessThanOrEqual(10e6);
    expect(await readFile(join(out, 'outputs'), 'utf8')).toMatch(
      /^(?:verdict=blocked\n(?:[a-z]+=\d+\n)+){2}$/,
    );
  });

  it('tells every finding from every other', () => {
    const count = verdict.manifests.flatMap(({ findings }) => findings).length;
    const { results } = JSON.parse(reports.sarif).runs[0];
    for (const prints of [
      results.map((one: { partialFingerprints: object }) => JSON.stringify(one.partialFingerprints)),
      JSON.parse(reports.gitlab).map(({ fingerprint }: { fingerprint: string }) => fingerprint),
    ])
      expect([prints.length, new Set(prints).size]).toEqual([count, count]);
  });

  it('is what GitLab documents', () => {
    expect(gitlabJudge(reports.gitlab)).toEqual([]);
  });

  it.skipIf(!sarifSchema.available)(`fits the schema of SARIF ${sarifSchema.reason}`, () => {
    expect(sarifJudge()(reports.sarif)).toEqual([]);
  });

  it.skipIf(!multitool.available)(`is taken in by GitHub ${multitool.reason}`, async () => {
    const said = await saidByMultitool(reports.sarif);
    expect(said.filter((one) => !one.startsWith('SARIF2005 '))).toEqual([]);
  });

  it.skipIf(!junitSchema.available)(`fits the schema of JUnit XML ${junitSchema.reason}`, async () => {
    expect((await junitJudge())(reports.junit)).toEqual([]);
  });
});

describe('the example after a change', { timeout: 300_000 }, () => {
  it('has in every report what somebody answers for; where hosts give room, also what stands, is cured and departs', async () => {
    const { folder, remove } = await exampleProject();
    const summary = join(folder, '.git/summary');
    const said = (kind: Kind) =>
      check(folder, ['--base', 'HEAD~1', '--report', kind], { GITHUB_STEP_SUMMARY: summary }).stdout;
    for (const kind of kinds) {
      const report = said(kind).replaceAll('\\', '');
      expect.soft(report, kind).toMatch(/gauge \| moved \(Office/);
      expect.soft(report, kind).toMatch(/[sS]tanding|unchanged/);
      if (kind === 'github' || kind === 'gitlab') continue;
      expect.soft(report, kind).toContain('model.release-missing');
      expect.soft(report, kind).toContain('a drop | is `known`');
    }
    // Annotations have no room for all; the summary that comes with them has.
    expect(await readFile(summary, 'utf8')).toBe(said('markdown'));
    await remove();
  });
});

describe('a project of hostile names', { timeout: 300_000 }, () => {
  let repository: TemporaryRepository;
  beforeAll(async () => {
    repository = await hostileProject(false);
  });
  afterAll(() => repository.remove());

  it.each([
    ['json', {}],
    ['sarif', {}],
    ['junit', { GITHUB_ACTIONS: 'true' }],
    ['gitlab', { GITLAB_CI: 'true' }],
    ['markdown', { GITHUB_ACTIONS: 'true' }],
  ] as const)('gives the same report on standard output as in a file: %s', async (kind, surroundings) => {
    const file = join(repository.folder, `.git/${kind}`);
    const words = ['--report', `${kind}=-`, '--report', `${kind}=${file}`];
    const { stdout, stderr } = check(repository.folder, words, surroundings);
    expect(stderr).toBe('');
    expect(stdout).toBe(await readFile(file, 'utf8'));
    expect(obeyedIn(stdout)).toEqual([]);
  });

  it('has a dossier of which nothing is obeyed when its texts are printed', async () => {
    const { folder } = repository;
    const drafted = spawned(folder, ['dossier', '--draft', '--out', '.git/draft'], {
      GITHUB_ACTIONS: 'true',
    });
    expect(drafted).toMatchObject({ status: 0, stderr: '' });
    expect(obeyedIn(drafted.stdout)).toEqual([]);
    const texts = (await readdir(join(folder, '.git/draft'))).filter((name) =>
      /\.(?:json|md|txt)$/.test(name),
    );
    expect(texts.length).toBeGreaterThan(5);
    for (const name of texts)
      expect.soft(obeyedIn(await readFile(join(folder, '.git/draft', name), 'utf8')), name).toEqual([]);
  });

  it.each([
    ['--at', 'a\n::error::mine'],
    ['--base', '##[error]mine'],
    ['--only', ' ::error::mine'],
    ['--phase', '::error::mine'],
    ['--report', '::error::mine'],
    ['--report', 'json=nowhere/\n::error::mine'],
    ['\n::error::mine'],
  ])('obeys nothing of a failure: %j', (...wrong) => {
    const failed = check(repository.folder, wrong, { GITHUB_ACTIONS: 'true' });
    expect(failed.status).not.toBe(0);
    expect(obeyedIn(failed.stdout)).toEqual([]);
    expect(obeyedIn(failed.stderr)).toEqual([]);
  });
});
