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
