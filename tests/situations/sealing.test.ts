import { afterEach, beforeEach, expect, it } from 'vitest';
import { check, stoplog } from '../harness/command.ts';
import { type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
beforeEach(async () => {
  project = await soundRepository();
});
afterEach(() => project.remove());

it('keeps an entry that was edited by hand as it stands until its own record is sealed', async () => {
  const spoilt = '"sealed_by": "Somebody Else"';
  await project.edit('stoplog.seals.json', (text) => text.replace(/"sealed_by": "[^"]*"/, spoilt));
  await project.edit('stoplog.yaml', (text) => text.replace('latitude: 52.5', 'latitude: 52.51'));
  const other = await stoplog(project.folder, ['seal', 'catchment']);
  expect(other.text).toMatch(/LEFT AS THEY ARE, .*\n {2}balance\.catchment\n/);
  expect(await project.read('stoplog.seals.json')).toContain(spoilt);
  expect((await check(project.folder)).blocking).toContain('seal.unreadable balance.catchment');

  const itself = await stoplog(project.folder, ['seal', 'balance.catchment']);
  expect(itself.text).toContain('balance.catchment   its entry could not be read');
  expect(await project.read('stoplog.seals.json')).not.toContain(spoilt);
  expect((await check(project.folder)).found.filter((one) => one.startsWith('seal.unreadable'))).toEqual([]);
});

it('says that a sealed record states what its files do not bear out', async () => {
  await project.edit('stoplog.yaml', (text) => text.replace('nse: 0.967', 'nse: 0.97'));
  await project.edit('stoplog.yaml', (text) => text.replace('pbias: 7.90', 'pbias: 1.25'));
  const sealed = await stoplog(project.folder, ['seal', 'evaluation.outlet-flow']);
  expect(sealed.status).toBe(0);
  expect(sealed.text).toMatch(
    /SEALED, BUT what is stated.*\n {2}evaluation\.outlet-flow\n {5}.*stated as 1\.25; the files give 7\.89/,
  );
  expect(sealed.text).toContain('stoplog seal --figures evaluation.outlet-flow');

  const corrected = await stoplog(project.folder, ['seal', '--figures', 'evaluation.outlet-flow']);
  expect(corrected.text).toContain('1.25 -> 7.9');
  expect(corrected.text).not.toContain('SEALED, BUT');
});

it('says so also where no figure can be written', async () => {
  await project.edit('stoplog.yaml', (text) =>
    text.replace('warm_up: 2001-10-01/2003-09-30', 'warm_up: 2001-10-01/2002-09-30'),
  );
  const { text } = await stoplog(project.folder, ['seal', 'periods']);
  expect(text).toMatch(
    /SEALED, BUT .*\n {2}periods\n(.+\n)+ {5}Correct what is wrong, the statement or the file/,
  );
});
