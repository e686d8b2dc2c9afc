import { afterAll, beforeAll, expect, it } from 'vitest';
import { stoplog } from '../harness/command.ts';
import { type SoundRepository, soundRepository } from '../harness/sound-repository.ts';

let project: SoundRepository;
beforeAll(async () => {
  project = await soundRepository();
});
afterAll(() => project.remove());

it.each([
  ['junit=', 'names no file after the equals sign', '`--report junit=PATH`'],
  ['pdf', 'a kind of report that does not exist', 'Kinds: text, json,'],
])('--report %s is refused with what to write', async (report, message, next) => {
  const { failure } = await stoplog(project.folder, ['check', '--report', report]);
  expect(failure).toMatchObject({
    code: 'usage',
    message: expect.stringContaining(message),
    next: expect.stringContaining(next),
  });
});
