import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { profilesOf } from '../../src/facts/profiles.ts';
import { readManifest } from '../../src/manifest/read.ts';
import { buildRecords } from '../../src/records/build.ts';
import { openSnapshot } from '../../src/repository/open-snapshot.ts';
import { openRepository } from '../../src/repository/repository.ts';
import { type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';

const manifestText = `stoplog: 1
inputs:
  rainfall:
    role: precipitation
    files: [data/rain.csv]
    series: {time: date, values: rain_mm, unit: mm/d, step: P1D}
    compare_with: {input: check-gauge}
  check-gauge:
    role: precipitation
    files: [data/check.csv]
    series: {time: date, values: rain_mm, unit: mm/d, step: P1D}
  temperature:
    role: temperature
    files: [data/temperature.csv]
    series: {time: date, values: t_mean, unit: degC, step: P1D}
`;

describe('a file that did not change', () => {
  let repository: TemporaryRepository;
  beforeEach(async () => {
    repository = await temporaryRepository();
    await repository.write('data/rain.csv', 'date,rain_mm\n2001-01-01,3\n2001-01-02,0\n');
    await repository.write('data/check.csv', 'date,rain_mm\n2001-01-01,4\n2001-01-02,1\n');
    await repository.write('data/temperature.csv', 'date,t_mean\n2001-01-01,3\n2001-01-02,-1\n');
    await repository.git('add', '.');
  });
  afterEach(() => repository.remove());

  /** The files whose content one run reads for the profiles, and what the profiles say. */
  async function run(
    options: { readonly remember?: boolean; readonly text?: string; readonly folder?: string } = {},
  ) {
    const opened = await openRepository(repository.folder, repository.environment);
    const snapshot = await openSnapshot(opened, { kind: 'index' }, { remember: options.remember ?? true });
    const read: string[] = [];
    const counted = {
      ...snapshot,
      read(path: string) {
        read.push(path);
        return snapshot.read(path);
      },
      stream(path: string) {
        read.push(path);
        return snapshot.stream(path);
      },
    };
    const { manifest } = readManifest(`${options.folder ?? ''}stoplog.yaml`, options.text ?? manifestText);
    if (manifest === null) throw new Error('unreadable');
    const profiles = await profilesOf(await buildRecords(manifest, counted), counted);
    await snapshot.close();
    return { read: read.sort(), profiles };
  }

  it('is read once, and never again in later runs', async () => {
    const first = await run();
    expect(first.read).toEqual(['data/check.csv', 'data/rain.csv', 'data/temperature.csv']);
    const second = await run();
    expect(second.read).toEqual([]);
    expect(second.profiles).toEqual(first.profiles);
  });

  it('is read again only beside one that did', async () => {
    await run();
    await repository.write('data/rain.csv', 'date,rain_mm\n2001-01-01,3\n2001-01-02,9\n');
    await repository.git('add', '.');
    expect((await run()).read).toEqual(['data/check.csv', 'data/rain.csv']);
  });

  it('is read again where its layout changed', async () => {
    await run();
    const text = manifestText.replace('unit: degC', 'unit: K');
    expect((await run({ text })).read).toEqual(['data/temperature.csv']);
  });

  it('is read anew where nothing is to be remembered', async () => {
    await run();
    expect((await run({ remember: false })).read).toHaveLength(3);
  });

  it('is not read again under another name', async () => {
    await run();
    await repository.git('mv', 'data/temperature.csv', 'data/warmth.csv');
    const text = manifestText.replace('data/temperature.csv', 'data/warmth.csv');
    expect((await run({ text })).read).toEqual([]);
  });

  it('is not taken for one of the same name beside another manifest', async () => {
    const text = (rain: string, ...gauges: string[]) => `stoplog: 1
inputs:
  rainfall:
    role: precipitation
    files: [${rain}]
    series: {time: date, values: rain_mm, unit: mm/d, step: P1D}
    compare_with: {input: gauges, file: rain.csv}
  gauges:
    role: precipitation
    files: [${gauges}]
    series: {time: date, values: rain_mm, unit: mm/d, step: P1D}
`;
    const days = Array.from({ length: 28 }, (_, day) => `2001-02-${`${day + 1}`.padStart(2, '0')}`);
    const table = (amount: number) =>
      `date,rain_mm\n${days.map((day, place) => `${day},${amount * (place % 4)}\n`).join('')}`;
    await repository.write('catchment.csv', table(1));
    await repository.write('rain.csv', table(2));
    await repository.write('data/rain.csv', table(3));
    await repository.git('add', '.');
    const above = { text: text('catchment.csv', 'rain.csv', 'data/rain.csv') };
    const below = { text: text('../catchment.csv', 'rain.csv', '../rain.csv'), folder: 'data/' };
    const heldIn = async (given: Parameters<typeof run>[0]) =>
      (await run(given)).profiles.get('rainfall')?.comparisons;
    const [first, second] = [await heldIn(above), await heldIn(below)];
    expect(second).toEqual(await heldIn({ ...below, remember: false }));
    expect(second).not.toEqual(first);
  });
});
