import { afterEach, describe, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { moreRain, type SoundRepository, soundRepository } from '../harness/sound-repository.ts';
import type { Edits } from '../harness/study.ts';

let project: SoundRepository;
afterEach(() => project.remove());

/** The choice of a method is missing; a named person lets it pass until a day. Invented, as all in the sound study. */
const lacking = { remove: ['setup.choices.3'] } as const;
const waiver = {
  rule: 'setup.choice-missing',
  record: 'setup',
  because: 'the routing is being rewritten',
  by: 'Eastmoor Rivers Office',
  until: '2021-03-31',
};
const withWaivers = (...waivers: readonly object[]): Edits => ({ ...lacking, set: { waivers } });

async function state(edits: Edits): Promise<void> {
  await project.state(edits);
  await stoplog(project.folder, ['seal', '--all', '--because', 'another matter']);
}

const checkOn = async (today: string) => (await stoplog(project.folder, ['check'], today)).text;

describe('a waiver', () => {
  it('lets its finding pass until its last day, and is said with who, why and until when', async () => {
    project = await soundRepository();
    await state(lacking);
    expect((await check(project.folder)).blocking).toEqual(['setup.choice-missing setup']);

    await state(withWaivers(waiver));
    const waived = await check(project.folder);
    expect(waived.status).toBe(0);
    expect(waived.finding('setup.choice-missing', 'setup')).toMatchObject({
      level: 'block',
      waived: 'the routing is being rewritten (Eastmoor Rivers Office, until 2021-03-31)',
    });
    expect(waived.verdict.totals).toMatchObject({ block: 0, waived: 1 });
    const said = (await checkOn('2021-03-31')).replace(/\s+/g, ' ');
    expect(said).toContain('BY SOMEBODY’S WORD waived: setup.choice-missing on setup: the routing is being');
    expect(said).toContain('(Eastmoor Rivers Office, until 2021-03-31)');
    expect(said).toContain('PASS');

    const expired = await checkOn('2021-04-01');
    expect(expired).toContain(
      'The waiver of setup.choice-missing for setup ended on 2021-03-31; today is 2021-04-01.',
    );
    expect(expired).toMatch(/^ {2}setup /m);
    expect(expired).toMatch(/^BLOCKED {3}2 findings to clear/m);
  });

  it('that has expired blocks a change too that has nothing to do with it', async () => {
    project = await soundRepository();
    await state(withWaivers({ ...waiver, until: '2021-02-28' }));
    await project.commit('On the last day of February');
    await project.git('checkout', '--quiet', '-b', 'change');
    await project.write('notes.txt', 'Gauge visited.\n');
    await project.commit();
    const compared = await check(project.folder, '--at', 'HEAD', '--base', 'main');
    expect(compared.blocking).toEqual(['waiver.expired manifest']);
    expect(compared.finding('setup.choice-missing', 'setup').standing).toBe(true);
    expect(compared.status).toBe(1);
  });

  it('that a change adds is shown first to whoever reviews the change', async () => {
    project = await soundRepository();
    await project.git('checkout', '--quiet', '-b', 'change');
    await state(withWaivers(waiver));
    await project.commit();
    const compared = await check(project.folder, '--at', 'HEAD', '--base', 'main');
    expect(compared.found[0]).toBe('manifest.loosened manifest');
    expect(compared.status).toBe(0);
  });

  it.each(['because', 'by', 'until'] as const)('without `%s` lets nothing pass', async (key) => {
    project = await soundRepository();
    await state(withWaivers({ ...waiver, [key]: undefined }));
    const held = await check(project.folder);
    expect(held.blocking).toContain('waiver.unsigned manifest');
    expect(held.blocking).toContain('setup.choice-missing setup');
  });

  it('for what is not there is told', async () => {
    project = await soundRepository();
    await state({ set: { waivers: [waiver] } });
    const unused = await check(project.folder);
    expect(unused.finding('waiver.unused', 'manifest').level).toBe('warn');
    expect(unused.status).toBe(0);
  });

  it('does not reach a broken seals file', async () => {
    project = await soundRepository();
    await state({ set: { waivers: [{ ...waiver, rule: 'seal.unreadable', record: undefined }] } });
    await project.edit('stoplog.seals.json', (text) =>
      text.replace('"sealed_on": "2021', '"sealed_on": "2020'),
    );
    const held = await check(project.folder);
    expect(held.status).toBe(1);
    expect(held.blocking.some((one) => one.startsWith('seal.unreadable '))).toBe(true);
  });

  it('does not reach a manifest that can’t be read', async () => {
    project = await soundRepository();
    await state({ set: { waivers: [{ ...waiver, rule: 'manifest.unreadable', record: undefined }] } });
    await project.edit('stoplog.yaml', (text) => `${text}unheard_of: 1\n`);
    const held = await check(project.folder);
    expect(held.blocking).toEqual(['manifest.unreadable manifest']);
    expect(held.status).toBe(1);
  });

  it('does not let a fault of another record pass', async () => {
    project = await soundRepository();
    await state(withWaivers(waiver));
    await project.edit('data/check.csv', moreRain('2005-01-01'));
    expect((await check(project.folder)).blocking).toContain('seal.stale inputs.check-gauge');
  });
});
