import { execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdir, mkdtemp, readdir, readFile, readlink, rm, stat, symlink, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import type { FailureCode } from '../../src/failure.ts';
import { check, stoplog } from '../harness/command.ts';
import { temporaryRepository } from '../harness/repository.ts';
import { type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository | undefined;
const folders: string[] = [];
afterEach(async () => {
  await project?.remove();
  project = undefined;
  for (const folder of folders.splice(0)) await rm(folder, { recursive: true, force: true });
});

/** Every file below a folder with its content, but for the disposable memory that Stoplog keeps under the git directory. */
async function contentOf(folder: string): Promise<Record<string, string>> {
  const entries = await readdir(folder, { recursive: true, withFileTypes: true });
  const content: Record<string, string> = {};
  for (const entry of entries) {
    const path = join(entry.parentPath, entry.name);
    if (path.startsWith(join(folder, '.git', 'stoplog'))) continue;
    if (entry.isSymbolicLink()) content[path] = `-> ${await readlink(path)}`;
    else if (entry.isFile())
      content[path] = createHash('sha256')
        .update(await readFile(path))
        .digest('hex');
  }
  return content;
}

const edited = (change: (text: string) => string) => (of: SoundRepository) => of.edit('stoplog.yaml', change);

/** What is done to the sound study; the rule and record found; the line, and words of the message. */
const findings: readonly {
  readonly name: string;
  readonly spoil: (of: SoundRepository) => Promise<unknown>;
  readonly rule: string;
  readonly record: string;
  readonly at: RegExp;
  readonly says: RegExp;
}[] = [
  {
    name: 'YAML that does not close a bracket',
    spoil: edited((text) => text.replace('2003-10-01/2007-09-30 ]', '2003-10-01/2007-09-30')),
    rule: 'manifest.unreadable',
    record: 'manifest',
    at: /^stoplog\.yaml:\d+$/,
    says: /./,
  },
  {
    name: 'a text where a number belongs',
    spoil: edited((text) => text.replace('value: 50, unit: km2', 'value: large, unit: km2')),
    rule: 'manifest.unreadable',
    record: 'manifest',
    at: /^stoplog\.yaml:\d+$/,
    says: /catchment\.area\.value.*"large".*number/,
  },
  {
    name: 'an unknown key, with the nearest known one',
    spoil: edited((text) => text.replace('  purpose: Daily', '  purpos: Daily')),
    rule: 'manifest.unreadable',
    record: 'manifest',
    at: /^stoplog\.yaml:8$/,
    says: /`purpos`.*`purpose`/,
  },
  {
    name: 'a key that stands twice',
    spoil: edited((text) => text.replace('  licence: CC-BY-4.0', '  licence: CC-BY-4.0\n  licence: MIT')),
    rule: 'manifest.unreadable',
    record: 'manifest',
    at: /^stoplog\.yaml:\d+$/,
    says: /licence/,
  },
  {
    name: 'a day that no calendar has',
    spoil: edited((text) => text.replace('2003-10-01/2007-09-30', '2003-02-29/2007-09-30')),
    rule: 'manifest.unreadable',
    record: 'manifest',
    at: /^stoplog\.yaml:\d+$/,
    says: /2003-02-29/,
  },
  {
    name: 'a seals file with conflict markers',
    spoil: (of) =>
      of.edit('stoplog.seals.json', (text) =>
        text.replace('{\n', '{\n<<<<<<< HEAD\n').replace('"records"', '=======\n>>>>>>> other\n"records"'),
      ),
    rule: 'seal.unreadable',
    record: 'manifest',
    at: /^stoplog\.seals\.json:2$/,
    says: /merge conflict/,
  },
  {
    name: 'a seals file cut short',
    spoil: (of) => of.edit('stoplog.seals.json', (text) => text.slice(0, 2000)),
    rule: 'seal.unreadable',
    record: 'manifest',
    at: /^stoplog\.seals\.json:\d+$/,
    says: /./,
  },
  {
    name: 'a seal edited by hand',
    spoil: (of) =>
      of.edit('stoplog.seals.json', (text) =>
        text.replace('"sealed_on": "2021-02-01"', '"sealed_on": "2021-02-02"'),
      ),
    rule: 'seal.unreadable',
    record: 'balance.catchment',
    at: /^stoplog\.seals\.json:\d+$/,
    says: /./,
  },
  {
    name: 'a data file that is a link out of the repository',
    spoil: async (of) => {
      await rm(join(of.folder, 'data/rain.csv'));
      await symlink('/etc/hostname', join(of.folder, 'data/rain.csv'));
    },
    rule: 'manifest.outside-repository',
    record: 'inputs.rainfall',
    at: /^stoplog\.yaml:\d+$/,
    says: /data\/rain\.csv/,
  },
  {
    name: 'a data file that is a link to nothing',
    spoil: async (of) => {
      await rm(join(of.folder, 'data/rain.csv'));
      await symlink('gone.csv', join(of.folder, 'data/rain.csv'));
    },
    rule: 'seal.stale',
    record: 'inputs.rainfall',
    at: /^stoplog\.yaml:\d+$/,
    says: /data\/rain\.csv/,
  },
  {
    name: 'a folder where a data file was',
    spoil: async (of) => {
      await rm(join(of.folder, 'data/rain.csv'));
      await mkdir(join(of.folder, 'data/rain.csv'));
    },
    rule: 'manifest.no-match',
    record: 'inputs.rainfall',
    at: /^stoplog\.yaml:\d+$/,
    says: /data\/rain\.csv/,
  },
];

describe('a fault in what a user keeps is a finding with its place', () => {
  it.each(findings)('$name', async ({ spoil, rule, record, at, says }) => {
    project = await soundRepository();
    await spoil(project);
    const before = await contentOf(project.folder);
    const checked = await check(project.folder);
    const finding = checked.finding(rule, record);
    expect(checked.status).toBe(1);
    expect(`${finding.file}:${finding.line}`).toMatch(at);
    expect(finding.message).toMatch(says);
    expect(finding.clear).not.toBe('');
    expect(await contentOf(project.folder)).toEqual(before);
  });

  it('tells every fault of a manifest at once', async () => {
    project = await soundRepository();
    await project.edit('stoplog.yaml', (text) =>
      text
        .replace('  purpose: Daily', '  purpos: Daily')
        .replace('value: 50,', 'value: large,')
        .replace('step: P1D', 'step: daily'),
    );
    const { verdict } = await check(project.folder);
    expect(verdict.manifests[0]?.findings.map(({ line }) => line)).toHaveLength(3);
  });
});

/** Where a person stands, what they type; how it fails, and words of what they read. */
const failures: readonly {
  readonly name: string;
  readonly words: readonly string[];
  readonly code: FailureCode;
  readonly says: RegExp;
  readonly next: RegExp;
}[] = [
  { name: 'an unknown command', words: ['chek'], code: 'usage', says: /chek/, next: /check/ },
  { name: 'an unknown option', words: ['check', '--stage'], code: 'usage', says: /--stage/, next: /--help/ },
  { name: 'an unknown phase', words: ['check', '--phase', 'done'], code: 'usage', says: /done/, next: /./ },
  {
    name: 'an unknown kind of report',
    words: ['check', '--report', 'pdf'],
    code: 'usage',
    says: /pdf/,
    next: /json/,
  },
  {
    name: 'an unknown record',
    words: ['check', '--only', 'inputs.rian'],
    code: 'usage',
    says: /inputs\.rian/,
    next: /inputs\.rainfall/,
  },
  {
    name: 'an unknown revision',
    words: ['check', '--at', 'v9'],
    code: 'unknown-revision',
    says: /v9/,
    next: /git/,
  },
  {
    name: 'an unknown rule',
    words: ['rules', 'seal.stail'],
    code: 'usage',
    says: /seal\.stail/,
    next: /seal\.stale/,
  },
  { name: 'sealing nothing', words: ['seal'], code: 'usage', says: /record/, next: /--all/ },
  {
    name: 'a report where no file can be',
    words: ['check', '--report', 'json=stoplog.yaml/x.json'],
    code: 'unwritable-file',
    says: /x\.json/,
    next: /./,
  },
];

describe('what could not be done is a failure that says what to do', () => {
  it.each(failures)('$name', async ({ words, code, says, next }) => {
    project = await soundRepository();
    const before = await contentOf(project.folder);
    const { status, failure } = await stoplog(project.folder, words);
    expect(status).toBe(2);
    expect(failure?.code).toBe(code);
    expect(failure?.message).toMatch(says);
    expect(failure?.next).toMatch(next);
    expect(`${failure?.message}${failure?.next}`).not.toMatch(/\n {4}at /);
    expect(await contentOf(project.folder)).toEqual(before);
  });

  it.each([
    ['cut short', (text: string) => text.slice(0, 2000)],
    ['of a later Stoplog', (text: string) => text.replaceAll('"scheme": 1', '"scheme": 99')],
  ])('a seals file %s is left as it is by a seal', async (_, spoil) => {
    project = await soundRepository();
    await project.edit('stoplog.seals.json', spoil);
    const before = await contentOf(project.folder);
    const { status, text } = await stoplog(project.folder, ['seal', '--all', '--figures']);
    expect(status).toBe(1);
    expect(text).toContain('NOT SEALED');
    expect(text).not.toContain('To stage');
    expect(await contentOf(project.folder)).toEqual(before);
  });

  it('a seals file that is a link is not written through', async () => {
    project = await soundRepository();
    const folder = await mkdtemp(join(tmpdir(), 'stoplog-elsewhere-'));
    folders.push(folder);
    await writeFile(join(folder, 'precious.txt'), 'mine\n');
    await rm(join(project.folder, 'stoplog.seals.json'));
    await symlink(join(folder, 'precious.txt'), join(project.folder, 'stoplog.seals.json'));
    const { failure } = await stoplog(project.folder, ['seal', '--all']);
    expect(failure?.code).toBe('cannot-seal');
    expect(failure?.message).toContain('symbolic link');
    expect(await readFile(join(folder, 'precious.txt'), 'utf8')).toBe('mine\n');
  });

  it('a report into a pipe is written to it, and the pipe stays', async () => {
    project = await soundRepository();
    const pipe = join(project.folder, '.git', 'pipe');
    execFileSync('mkfifo', [pipe]);
    const read = readFile(pipe, 'utf8');
    await stoplog(project.folder, ['check', '--report', `json=${pipe}`]);
    expect(await read).toContain('stoplog-findings/1');
    expect((await stat(pipe)).isFIFO()).toBe(true);
  });

  it('a folder in no repository', async () => {
    const folder = await mkdtemp(join(tmpdir(), 'stoplog-nowhere-'));
    folders.push(folder);
    const { status, failure } = await stoplog(folder, ['check']);
    expect([status, failure?.code]).toEqual([2, 'no-repository']);
    expect(failure?.next).toContain('git init');
  });

  it('a repository without commits and without a manifest', async () => {
    const { folder } = await temporaryRepository();
    folders.push(folder);
    const { status, failure } = await stoplog(folder, ['check']);
    expect([status, failure?.code]).toEqual([2, 'no-manifest']);
    expect(failure?.next).toContain('stoplog: 1');
  });

  it('a manifest that is not staged yet, for the hook', async () => {
    const { folder, write } = await temporaryRepository({ 'readme.txt': 'A model.\n' });
    folders.push(folder);
    await write('stoplog.yaml', 'stoplog: 1\n');
    expect((await stoplog(folder, ['check'])).status).toBe(1);
    const { failure } = await stoplog(folder, ['check', '--at', 'index']);
    expect(failure?.code).toBe('no-manifest');
    expect(failure?.next).toContain('git add :/stoplog.yaml');
  });

  it('nobody to sign a seal', async () => {
    const { folder, git } = await temporaryRepository();
    folders.push(folder);
    await writeFile(join(folder, 'stoplog.yaml'), 'stoplog: 1\nstudy: {title: A study}\n');
    await git('config', 'user.useConfigOnly', 'true');
    const anonymous = {
      GIT_COMMITTER_NAME: '',
      GIT_COMMITTER_EMAIL: '',
      GIT_AUTHOR_NAME: '',
      GIT_AUTHOR_EMAIL: '',
    };
    const { failure } = await stoplog(folder, ['seal', '--all'], '2021-03-01', anonymous);
    expect(failure?.code).toBe('no-identity');
    expect(failure?.next).toContain('user.name');
  });

  it('no git on PATH', async () => {
    project = await soundRepository();
    const { failure } = await stoplog(project.folder, ['check'], '2021-03-01', { PATH: '/nonexistent' });
    expect(failure?.code).toBe('no-git');
    expect(failure?.next).toMatch(/install/i);
  });
});
