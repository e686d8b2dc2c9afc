import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Ran, stoplog } from '../harness/command.ts';
import { type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';
import { soundFiles } from '../harness/sound-files.ts';

/** The README's path from nothing to a first pass: its manifest, and the commands below it. */
const [, manifest = '', commands = ''] =
  /```yaml\n(stoplog: 1\n.*?)```\n\nThen:\n\n```\n(.*?)```/s.exec(readFileSync('README.md', 'utf8')) ?? [];

/** The files that the README says are there; every figure is invented. */
function files(): Record<string, string> {
  const sound = soundFiles();
  const text = (path: string) => sound[path] ?? '';
  const [head = '', ...rows] = text('runs/calibrated/daily.csv').trimEnd().split('\n');
  const flow = head.split(',').indexOf('flow_m3s');
  const dated = rows.map((row) => `${row.split(',')[0]},${row.split(',')[flow]}\n`);
  return {
    'data/rain.csv': text('data/rain.csv'),
    'data/flow.csv': text('data/flow.csv'),
    'model/parameters.txt': text('model/parameters.txt'),
    'runs/daily.csv': `date,flow_m3s\n${dated.join('')}`,
    'stoplog.yaml': manifest,
  };
}

describe('the first steps in README.md', () => {
  let project: TemporaryRepository;
  const ran: (Ran & { readonly line: string })[] = [];

  beforeAll(async () => {
    project = await temporaryRepository();
    for (const [path, content] of Object.entries(files())) await project.write(path, content);
    for (const line of commands
      .trimEnd()
      .split('\n')
      .map((one) => one.replace(/\s+#.*/, ''))) {
      const [program, ...words] = [...line.matchAll(/"([^"]*)"|(\S+)/g)].map(
        ([word, quoted]) => quoted ?? word,
      );
      if (program === 'git') await project.git(...words);
      else ran.push({ line, ...(await stoplog(project.folder, words)) });
    }
  });
  afterAll(() => project.remove());

  it('lead from a first check that holds back to one that passes', () => {
    expect(ran.map(({ line, status }) => [line, status])).toEqual([
      ['stoplog check', 1],
      ['stoplog seal --all --figures', 0],
      ['stoplog check', 0],
    ]);
  });

  it('are held back only for seals and for scores that are computed in the next step', () => {
    const [blocked = ''] = (ran[0]?.text ?? '').split('\nNOTED');
    const rules = [...blocked.matchAll(/^ +\((\S+)\)$/gm)].map(([, rule]) => rule);
    expect([...new Set(rules)].sort()).toEqual(['evaluation.missing', 'seal.missing']);
  });

  it('leave nothing to warn of in phase calibration', () => {
    expect(ran[2]?.text).toContain('phase calibration');
    expect(ran[2]?.text).toMatch(/^PASS {3}0 findings to clear, 0 warnings, /m);
  });

  it('are committed whole', async () => {
    expect(await project.git('status', '--porcelain')).toBe('');
    expect((await stoplog(project.folder, ['check', '--at', 'HEAD'])).status).toBe(0);
  });
});
