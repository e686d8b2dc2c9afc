import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { Context } from '../../src/commands/command.ts';
import { tellGithub } from '../../src/commands/tell-github.ts';
import { withoutCommands } from '../../src/commands/without-commands.ts';
import { inert } from '../../src/reports/escape.ts';
import { explain } from '../../src/reports/explain.ts';
import { githubOutputs, githubReport } from '../../src/reports/github.ts';
import { gitlabReport } from '../../src/reports/gitlab.ts';
import { jsonReport } from '../../src/reports/json.ts';
import { junitReport } from '../../src/reports/junit.ts';
import { markdownReport } from '../../src/reports/markdown.ts';
import { sarifReport } from '../../src/reports/sarif.ts';
import { textReport } from '../../src/reports/text.ts';
import { finding } from '../harness/finding.ts';
import { outsidePackage } from '../harness/outside.ts';
import { obeyedIn } from './runner.ts';
import { everyVerdict, faulty, hostile, hostileTexts, large, sound, verdictOf } from './verdicts.ts';

const verdicts = await everyVerdict();
const one = (over: object) => verdictOf([finding(over)]);

describe('annotations', () => {
  it.each(verdicts)('are at most ten of a kind, and nothing else is obeyed: %s', (_name, verdict) => {
    const obeyed = obeyedIn(githubReport(verdict));
    expect(obeyed.every(({ command }) => ['error', 'warning', 'notice'].includes(command))).toBe(true);
    for (const kind of ['error', 'warning', 'notice'])
      expect(obeyed.filter(({ command }) => command === kind).length).toBeLessThanOrEqual(10);
  });

  it('come worst first, with what is left out counted', async () => {
    const kinds = obeyedIn(githubReport(large)).map(({ command }) => command);
    expect(kinds).toEqual(['error', 'warning', 'notice'].flatMap((kind) => Array(10).fill(kind)));
    expect(obeyedIn(githubReport(large))[9]?.data).toBe('... and 991 more; the job summary lists them.');
    expect(obeyedIn(githubReport(await faulty))[0]?.command).toBe('error');
    expect(githubReport(await sound)).toMatch(/\nstoplog: pass: 0 findings to clear, [^\n]*\n$/);
  });

  it('say where, what and what to do', () => {
    expect(githubReport(one({ file: 'data/a,b:c.csv', trail: [], detail: [] }))).toBe(
      '::error title=inputs.rainfall (seal.stale),file=data/a%2Cb%3Ac.csv,line=41,col=3::data/rain/upper.csv is not the file ' +
        'that was sealed on 2020-03-02.%0ATo clear: Check the new data, then: stoplog seal inputs.rainfall\n' +
        'stoplog: blocked: 1 finding to clear, 0 warnings, 0 notes\n',
    );
  });

  it('put a change that asks for less first, and what stands or is answered for last', () => {
    const comparison = { asked: 'main', strict: false, unavailable: null, notes: [] };
    const told = verdictOf(
      [
        finding({ waived: 'gauge moved (A, until 2030-01-01)', fingerprint: 'a' }),
        finding({ standing: true, fingerprint: 'b' }),
        finding({ level: 'note', fingerprint: 'c' }),
        finding({ level: 'warn', fingerprint: 'd' }),
        finding({ level: 'warn', rule: 'manifest.loosened', fingerprint: 'e' }),
      ],
      {},
      comparison,
    );
    expect(obeyedIn(githubReport(told)).map(({ properties }) => properties.title)).toEqual([
      'inputs.rainfall (manifest.loosened)',
      'inputs.rainfall (seal.stale)',
      'inputs.rainfall (seal.stale)',
      'standing: inputs.rainfall (seal.stale)',
      'answered for: inputs.rainfall (seal.stale)',
    ]);
  });
});

describe('what to know of the base', () => {
  it('is the first warning, within the ten', () => {
    const comparison = { asked: 'main', strict: false, unavailable: 'The history is too short.', notes: [] };
    const many = Array.from({ length: 30 }, (_, index) =>
      finding({ level: 'warn', fingerprint: `${index}` }),
    );
    const told = { ...verdictOf(many, {}, comparison), base: null };
    const warnings = obeyedIn(githubReport(told));
    expect(warnings).toHaveLength(10);
    expect(warnings[0]).toMatchObject({
      command: 'warning',
      data: expect.stringMatching(/^Not compared with main: /),
    });
    expect(warnings[9]?.data).toBe('... and 22 more; the job summary lists them.');
    for (const report of [junitReport(told), markdownReport(told), sarifReport(told, '1.2.3')])
      expect(report).toContain('The history is too short.');
  });
});

describe('escaping, by GitHub’s own toolkit', () => {
  const toolkit = outsidePackage('@actions/core');

  it.skipIf(!toolkit.available)(`is the same for every hostile text ${toolkit.reason}`, async () => {
    const core = await import(pathToFileURL(join(toolkit.folder, 'lib/core.js')).href);
    for (const text of hostileTexts.map((one) => one.replaceAll('\ud800', ''))) {
      const told = finding({ message: text, file: text, record: 'inputs.rainfall' });
      let printed = '';
      const spy = vi.spyOn(process.stdout, 'write').mockImplementation((words) => {
        printed += words;
        return true;
      });
      try {
        core.error(explain(told).join('\n'), {
          ...{ title: 'inputs.rainfall (seal.stale)', file: text, startLine: 41, startColumn: 3 },
        });
      } finally {
        spy.mockRestore();
      }
      const [first] = githubReport(verdictOf([told])).split('\n');
      expect(first).toBe(printed.trimEnd());
      // What another escaping gives is seen to differ.
      if (/[%\r\n]/.test(text))
        expect(first?.replaceAll('%25', '%').replaceAll('%0D', '')).not.toBe(printed.trimEnd());
    }
  });
});

describe('a stranger’s words in other output', () => {
  /** What reaches the log when a command prints its words. */
  function logged(text: string, may?: 'command'): string {
    let log = '';
    const context = withoutCommands({
      write: (words: string) => {
        log += words;
      },
      tell: (words: string) => {
        log += words;
      },
    } as unknown as Context);
    context.write(text, may);
    if (may === undefined) context.tell(text);
    return log;
  }

  it.each(hostileTexts)('%j would be obeyed at the start of a line, and is not', (text) => {
    for (const words of [text, `  ${text}\n`, `\n\u0085 ${text}`])
      expect(obeyedIn(logged(words))).toEqual([]);
  });

  it('would be obeyed as it is', () => {
    expect(
      obeyedIn('::error::mine\n  ##[add-mask]a\nb ##vso[task.x y]c').map(({ command }) => command),
    ).toEqual(['error', 'add-mask', 'task.x']);
    expect(hostileTexts.flatMap(obeyedIn).length).toBeGreaterThan(5);
  });

  it('can be told from what was written', () => {
    expect(inert('a\n  ::error::mine ##[b]')).toBe('a\n  \\u{3a}:error::mine \\u{23}#[b]');
  });

  it('leaves our annotations and harmless output as they are', () => {
    expect(logged('::error::ours\n', 'command')).toBe('::error::ours\n');
    expect(inert('a::b # [c] ## [d]\n : :e\n')).toBe('a::b # [c] ## [d]\n : :e\n');
  });

  it.each([
    ['text', textReport(hostile, { color: false, extent: 'whole' })],
    ['json', jsonReport(hostile)],
    ['sarif', sarifReport(hostile, '1.2.3')],
    ['junit', junitReport(hostile)],
    ['gitlab', gitlabReport(hostile)],
    ['markdown', markdownReport(hostile)],
  ])('is never obeyed when a file with the %s report is printed', (_kind, report) => {
    expect(obeyedIn(report)).toEqual([]);
    expect(inert(report)).toBe(report);
    // Read by a program, nothing of it is lost.
    if (report.startsWith('{')) expect(report).toContain('\\u0023#[error]mine');
  });

  it('reaches programs unchanged', () => {
    expect(JSON.parse(jsonReport(hostile))).toEqual(JSON.parse(JSON.stringify(hostile)));
  });
});

describe('summary and outputs', () => {
  let folder: string;
  beforeEach(async () => {
    folder = await mkdtemp(join(tmpdir(), 'stoplog-runner-'));
  });
  afterEach(() => rm(folder, { recursive: true }));

  it.each(verdicts)('are added to the files that the runner names: %s', async (_name, verdict) => {
    const [summary, output] = [join(folder, 'summary'), join(folder, 'output')];
    const environment = { GITHUB_STEP_SUMMARY: summary, GITHUB_OUTPUT: output };
    await tellGithub({ environment } as unknown as Context, verdict);
    const text = await readFile(summary, 'utf8');
    expect(text).toContain(`## Stoplog: ${verdict.verdict}`);
    expect(Buffer.byteLength(text)).toBeLessThan(1024 * 1024);
    expect(await readFile(output, 'utf8')).toBe(githubOutputs(verdict));
  });

  it('keep within what GitHub takes of a step, however often it checks', async () => {
    const summary = join(folder, 'summary');
    for (let turn = 0; turn < 3; turn++)
      await tellGithub({ environment: { GITHUB_STEP_SUMMARY: summary } } as unknown as Context, large);
    const text = await readFile(summary, 'utf8');
    expect(Buffer.byteLength(text)).toBeLessThanOrEqual(1024 * 1024);
    expect(text.match(/^## Stoplog: blocked$/gm)?.length).toBeGreaterThan(1);
  });

  it('are the verdict and its counts, one line each', () => {
    const lines = githubOutputs(hostile).trimEnd().split('\n');
    expect(lines[0]).toBe('verdict=blocked');
    expect(lines.slice(1).every((line) => /^[a-z]+=\d+$/.test(line))).toBe(true);
    expect(lines).toContain(`block=${hostileTexts.length}`);
  });

  it('are left alone where there is no runner, and a file that can’t be written is said', async () => {
    await tellGithub({ environment: {} } as unknown as Context, large);
    const environment = { GITHUB_OUTPUT: join(folder, 'gone', 'output') };
    await expect(tellGithub({ environment } as unknown as Context, large)).rejects.toMatchObject({
      code: 'unwritable-file',
    });
  });
});
