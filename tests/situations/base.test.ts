import { mkdir, mkdtemp, realpath, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { gitIn } from '../harness/repository.ts';
import { moreRain, type SoundRepository, soundRepository, workingIn } from '../harness/sound-repository.ts';

let project: SoundRepository;
const folders: string[] = [];
afterEach(async () => {
  await project.remove();
  for (const folder of folders.splice(0)) await rm(folder, { recursive: true });
});

/** Forty parameters whose values lie outside the range they were searched in, as an old model may bring along. */
const doubtful = Array.from({ length: 40 }, (_, place) => ({
  name: `old_${place + 1}`,
  unit: 'mm',
  change: 'set',
  initial: 1,
  value: 9,
  range: [0, 5],
  range_from: 'report 3',
  scope: 'whole catchment',
}));
const legacy = { 'parameters.values': doubtful };

/** A study with forty findings on `main`, and a branch for a change. */
async function legacyRepository(): Promise<void> {
  project = await soundRepository();
  await project.state({ set: legacy });
  await project.commit('What was always there');
  await project.git('checkout', '--quiet', '-b', 'change');
}

const told = async (...words: string[]) => (await stoplog(project.folder, ['check', ...words])).text;
const againstMain = ['--at', 'HEAD', '--base', 'main'];

describe('a repository with forty findings', () => {
  it('lets an unrelated commit pass, and lists what stands', async () => {
    await legacyRepository();
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.commit();
    const whole = await check(project.folder, '--at', 'HEAD');
    expect(whole.status).toBe(1);
    expect(whole.verdict).toMatchObject({ base: null, comparison: null });
    const outOfRange = (found: readonly string[]) =>
      found.filter((one) => one === 'parameters.out-of-range parameters');
    expect(outOfRange(whole.blocking)).toHaveLength(40);

    const compared = await check(project.folder, ...againstMain);
    expect(compared.status).toBe(0);
    const base = (await project.git('rev-parse', '--short=7', 'main')).trim();
    expect(compared.verdict).toMatchObject({
      base,
      comparison: { asked: 'main', strict: false, unavailable: null, notes: [] },
      totals: { block: 0, cured: 0 },
    });
    expect(compared.found).toEqual(whole.found);
    expect(compared.verdict.totals.standing).toBe(
      whole.verdict.totals.block + whole.verdict.totals.warn + whole.verdict.totals.note,
    );
    const text = await told(...againstMain);
    expect(text).toContain(`against ${base}`);
    expect(text).toMatch(/^STANDING {3}\d+ findings that .* had already$/m);
    expect(text).toMatch(/^ {2}parameters: .*parameters\.out-of-range/m);
    expect(text).toMatch(/^PASS {3}0 findings to clear, .*; \d+ standing, 0 cured$/m);
  });

  it('blocks with --strict', async () => {
    await legacyRepository();
    const strict = await check(project.folder, ...againstMain, '--strict');
    expect(strict.status).toBe(1);
    expect(strict.verdict.comparison?.strict).toBe(true);
    expect(strict.verdict.totals.block).toBe(strict.blocking.length);
    expect(await told(...againstMain, '--strict')).toMatch(/^BLOCKED {3}\d+ records$/m);
  });

  it('blocks a new fault, in what is staged too', async () => {
    await legacyRepository();
    await project.edit('data/check.csv', moreRain('2005-01-01'));
    await project.git('add', 'data/check.csv');
    for (const at of ['worktree', 'index']) {
      const held = await check(project.folder, '--at', at, '--base', 'main');
      expect(held.status).toBe(1);
      expect(held.finding('seal.stale', 'inputs.check-gauge').standing).toBe(false);
    }
    await project.commit();
    const text = await told(...againstMain);
    expect(text).toMatch(/^ {2}inputs\.check-gauge {3}stale/m);
    expect(text).toContain('STANDING');
  });

  it('says what was cured, and asks for the rest of a record that was touched', async () => {
    await legacyRepository();
    await project.state({ set: { 'parameters.values': doubtful.slice(1) } });
    await project.commit();
    const touched = await check(project.folder, ...againstMain);
    expect(touched.status).toBe(1);
    expect(touched.verdict.totals.cured).toBeGreaterThan(0);
    expect(touched.verdict.manifests[0]?.cured).toContainEqual(
      expect.objectContaining({
        rule: 'parameters.out-of-range',
        record: 'parameters',
        message: expect.stringContaining('old_1'),
      }),
    );
    expect(touched.finding('parameters.out-of-range', 'parameters').standing).toBe(false);
    expect(await told(...againstMain)).toMatch(/^CURED {3}\d+ findings? that .* had$\n {2}parameters: /m);
  });

  it('stays passed when lines move and reasons are reworded', async () => {
    await legacyRepository();
    await project.edit('stoplog.yaml', (text) => `# Moved down\n# by two lines.\n${text}`);
    await project.edit('stoplog.yaml', (text) =>
      text.replaceAll('rain differs little', 'rain hardly differs'),
    );
    await project.commit();
    const reworded = await check(project.folder, ...againstMain);
    expect(reworded.finding('seal.reworded', 'setup').standing).toBe(false);
    expect(reworded.verdict.totals).toMatchObject({ block: 0, cured: 0 });
  });

  it('has nothing cured by a manifest that can’t be read any more', async () => {
    await legacyRepository();
    await project.write('stoplog.yaml', 'stoplog: 1\nstudy: [\n');
    await project.commit();
    const broken = await check(project.folder, ...againstMain);
    expect(broken.verdict).toMatchObject({ verdict: 'blocked', totals: { standing: 0, cured: 0 } });
  });
});

describe('what a change answers for', () => {
  it('is a raised phase: what was a note does not stand as a block', async () => {
    project = await soundRepository();
    await project.state({ set: { 'study.phase': 'calibration' }, remove: ['balance'] });
    await stoplog(project.folder, ['seal', '--all']);
    await project.commit('A young study');
    await project.git('checkout', '--quiet', '-b', 'change');
    expect((await check(project.folder, ...againstMain)).status).toBe(0);
    await project.state({ remove: ['balance'] });
    await stoplog(project.folder, ['seal', '--all']);
    await project.commit();
    const raised = await check(project.folder, ...againstMain);
    expect(raised.finding('balance.missing', 'balance.catchment')).toMatchObject({
      level: 'block',
      standing: false,
    });
    expect(raised.status).toBe(1);
  });

  it('is a lowered bar, shown before all else, also when it was lowered commits ago', async () => {
    project = await soundRepository();
    await project.git('checkout', '--quiet', '-b', 'change');
    await project.state({ set: { 'study.phase': 'setup' } });
    await project.commit();
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.edit('data/check.csv', (text) => `${text}\n`);
    await project.commit();
    expect((await check(project.folder, '--at', 'HEAD')).found).not.toContain('manifest.loosened manifest');
    const compared = await check(project.folder, ...againstMain);
    expect(compared.found[0]).toBe('manifest.loosened manifest');
    expect(compared.finding('manifest.loosened', 'manifest').standing).toBe(false);
    expect(await told(...againstMain)).toMatch(/sound\n\nASKS FOR LESS {3}1 change\n[\s\S]*back from phase/);
  });

  it('is a manifest that can’t be read, also where it could not before', async () => {
    project = await soundRepository();
    const sound = await project.read('stoplog.yaml');
    await project.write('stoplog.yaml', 'stoplog: 1\nstudy: [\n');
    await project.commit('Broken');
    await project.git('checkout', '--quiet', '-b', 'change');
    expect((await check(project.folder, ...againstMain)).status).toBe(1);

    await project.write('stoplog.yaml', sound);
    await project.commit('Mended');
    const mended = await check(project.folder, ...againstMain);
    expect(mended.status).toBe(0);
    expect(mended.verdict.comparison?.notes).toEqual([
      expect.stringMatching(/stoplog\.yaml could not be read in/),
    ]);
    expect(mended.verdict.manifests[0]?.cured).toContainEqual(
      expect.objectContaining({ rule: 'manifest.unreadable' }),
    );
  });

  it('is every finding where the base had no manifest', async () => {
    await legacyRepository();
    await project.git('checkout', '--quiet', '--orphan', 'empty');
    await project.git('rm', '--quiet', '-rf', '.');
    await project.git('commit', '--quiet', '--allow-empty', '-m', 'Nothing yet');
    await project.git('checkout', '--quiet', '-b', 'begun');
    await project.git('checkout', '--quiet', 'main', '--', '.');
    await project.commit('The model');
    const begun = await check(project.folder, '--at', 'HEAD', '--base', 'empty');
    expect(begun.status).toBe(1);
    expect(begun.verdict).toMatchObject({ base: expect.any(String), totals: { standing: 0, cured: 0 } });
  });
});

describe('a base that is less simple', () => {
  const commits = (...words: string[]) => project.git('commit', '--quiet', '--all', ...words);
  const faultIn = async (table: string) => {
    await project.edit(`data/${table}.csv`, moreRain('2005-01-01'));
    await commits('-m', table);
  };

  it('is the same state: all stands', async () => {
    await legacyRepository();
    const compared = await check(project.folder, ...againstMain);
    expect(compared.status).toBe(0);
    expect(compared.verdict.totals).toMatchObject({ block: 0, warn: 0, note: 0, cured: 0 });
  });

  it('is the target of a pull request, and what is checked is the merge that the host made of both', async () => {
    await legacyRepository();
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.commit();
    await project.git('checkout', '--quiet', 'main');
    await faultIn('check');
    const merged = async () => {
      await project.git('checkout', '--quiet', '--detach', 'main');
      await project.git('merge', '--quiet', '-m', 'Pull request', 'change');
      return check(project.folder, ...againstMain);
    };
    const sound = await merged();
    expect(sound.verdict.base).toBe((await project.git('rev-parse', '--short=7', 'main')).trim());
    expect(sound.finding('seal.stale', 'inputs.check-gauge').standing).toBe(true);
    expect(sound.status).toBe(0);

    await project.git('checkout', '--quiet', 'change');
    await faultIn('flow');
    const faulty = await merged();
    expect(faulty.finding('seal.stale', 'inputs.check-gauge').standing).toBe(true);
    expect(faulty.finding('seal.stale', 'inputs.streamflow').standing).toBe(false);
    expect(faulty.status).toBe(1);
  });

  it('is one of several after a criss-cross of merges, which is said', async () => {
    project = await soundRepository();
    await project.git('branch', 'change');
    await faultIn('check');
    await project.git('checkout', '--quiet', 'change');
    await faultIn('flow');
    const [one, two] = [await project.git('rev-parse', 'main'), await project.git('rev-parse', 'change')];
    for (const [branch, other] of [['main', two] as const, ['change', one] as const]) {
      await project.git('checkout', '--quiet', branch);
      await project.git('merge', '--quiet', '-m', 'Crossed', other.trim());
    }
    const crossed = await check(project.folder, ...againstMain);
    const stands = ['check-gauge', 'streamflow'].map(
      (input) => crossed.finding('seal.stale', `inputs.${input}`).standing,
    );
    expect(stands.sort()).toEqual([false, true]);
    expect(crossed.status).toBe(1);
    expect(crossed.verdict.comparison?.notes).toEqual([
      expect.stringMatching(/^main and this were merged crosswise.*Merge main into this/),
    ]);
    await project.git('merge', '--quiet', '-m', 'Once more', 'main');
    expect(await check(project.folder, ...againstMain)).toMatchObject({
      status: 0,
      verdict: { comparison: { notes: [] } },
    });
  });

  it('is followed where the model was moved to another folder', async () => {
    await legacyRepository();
    const names = (await project.git('ls-tree', '--name-only', 'HEAD')).trim().split('\n');
    await mkdir(join(project.folder, 'models/harrow'), { recursive: true });
    await project.git('mv', ...names, 'models/harrow');
    await project.commit();
    const moved = await check(project.folder, ...againstMain);
    expect(moved.status).toBe(0);
    expect(moved.verdict.totals).toMatchObject({ block: 0, cured: 0 });
    const base = (await project.git('rev-parse', '--short=7', 'main')).trim();
    expect(moved.verdict.comparison?.notes).toEqual([
      `models/harrow/stoplog.yaml is compared with stoplog.yaml of ${base}.`,
    ]);

    await project.edit('models/harrow/stoplog.yaml', (text) =>
      text.replace('phase: application', 'phase: setup'),
    );
    await project.commit();
    expect((await check(project.folder, ...againstMain)).found[0]).toBe('manifest.loosened manifest');
  });
});

describe('where the base can’t be had, all is checked and the way out is said', () => {
  it('a base that moved on is compared where the change left it', async () => {
    await legacyRepository();
    const left = (await project.git('rev-parse', '--short=7', 'HEAD')).trim();
    await project.git('checkout', '--quiet', 'main');
    await project.state({});
    await project.commit('All cured on main');
    await project.git('checkout', '--quiet', 'change');
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.commit();
    const compared = await check(project.folder, ...againstMain);
    expect(compared.verdict.base).toBe(left);
    expect(compared.status).toBe(0);
  });

  it('a base that does not exist', async () => {
    await legacyRepository();
    const checked = await check(project.folder, '--at', 'HEAD', '--base', 'origin/mian');
    expect(checked.status).toBe(1);
    expect(checked.verdict).toMatchObject({
      base: null,
      comparison: { unavailable: expect.stringMatching(/"origin\/mian" names no commit.*git fetch/) },
      totals: { standing: 0 },
    });
    expect(await told('--at', 'HEAD', '--base', 'origin/mian')).toMatch(/^Not compared with origin\/mian: /m);
  });

  it('a base with another past', async () => {
    await legacyRepository();
    await project.git('checkout', '--quiet', '--orphan', 'other');
    await project.git('commit', '--quiet', '-m', 'Another beginning');
    const checked = await check(project.folder, ...againstMain);
    expect(checked.status).toBe(1);
    expect(checked.verdict.comparison?.unavailable).toMatch(/shares no commit with main/);
  });

  it('a cut-off history', async () => {
    await legacyRepository();
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.commit();
    await project.git('checkout', '--quiet', 'main');
    await project.write('more.txt', 'x\n');
    await project.commit();
    const folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
    folders.push(folder);
    const url = `file://${project.folder}`;
    await gitIn(folder)(
      'clone',
      '--quiet',
      '--depth=1',
      '--no-single-branch',
      '--branch=change',
      url,
      'clone',
    );
    const clone = workingIn(join(folder, 'clone'));
    const checked = await check(clone.folder, '--at', 'HEAD', '--base', 'origin/main');
    expect(checked.status).toBe(1);
    expect(checked.verdict.comparison?.unavailable).toMatch(
      /only those were fetched.*--unshallow.*fetch depth 0/,
    );
    await clone.git('fetch', '--quiet', '--unshallow');
    expect((await check(clone.folder, '--at', 'HEAD', '--base', 'origin/main')).status).toBe(0);
  });

  it('older content that was never fetched', async () => {
    await legacyRepository();
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.commit();
    await project.git('config', 'uploadpack.allowFilter', 'true');
    const folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
    folders.push(folder);
    const url = `file://${project.folder}`;
    await gitIn(folder)('clone', '--quiet', '--filter=tree:0', '--branch=change', url, 'clone');
    const checked = await check(join(folder, 'clone'), '--at', 'HEAD', '--base', 'origin/main');
    expect(checked.status).toBe(1);
    expect(checked.verdict.comparison?.unavailable).toMatch(/base could not be read.*--refetch/s);
  });
});

describe('a first manifest', () => {
  it('is told that the base has none, so that everything counts as new', async () => {
    project = await soundRepository();
    await project.state({ set: legacy });
    await project.git('rm', '--quiet', '--cached', 'stoplog.yaml', 'stoplog.seals.json');
    await project.git('commit', '--quiet', '--message', 'As it was for years');
    await project.git('add', 'stoplog.yaml', 'stoplog.seals.json');
    await project.commit('Records begun');
    const { verdict, status } = await check(project.folder, '--at', 'HEAD', '--base', 'HEAD~1');
    expect(status).toBe(1);
    expect(verdict.comparison?.notes).toEqual([
      expect.stringMatching(/^[0-9a-f]{7,} holds no manifest yet, so all that is found counts as new\./),
    ]);
    const same = await check(project.folder, '--at', 'HEAD', '--base', 'HEAD');
    expect([same.status, same.verdict.comparison?.notes]).toEqual([0, []]);
  });
});
