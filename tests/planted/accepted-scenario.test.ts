import { describe, expect, it } from 'vitest';
import { check, example } from './fennock.ts';
import { plant } from './plant.ts';

/** The word that lets the dry scenario of the example pass, in files changed like this. */
async function acceptedIn(files: Readonly<Record<string, string>>): Promise<string | null> {
  const found = await check.findingsIn(files);
  const beyond = found.filter(({ rule, level }) => rule === 'scenarios.beyond-range' && level === 'block');
  expect(beyond).toHaveLength(1);
  return beyond[0]?.accepted ?? null;
}

const fault = { rule: '', record: '', fault: '' };
const inManifest = (was: string, is: string) =>
  plant({ ...fault, in: 'stoplog.yaml', change: { [was]: is } }, example);

describe('an acceptance of a scenario beyond what was calibrated', () => {
  it('lets it pass with reason, person and date', async () => {
    expect(await acceptedIn(example)).toMatch(/^18 % drier .* \(Northmere Catchment Office, 2025-03-10\)$/);
  });

  it('is for one driver', async () => {
    const files = inManifest('driver: annual_rainfall', 'driver: summer_evapotranspiration');
    expect(await acceptedIn(await check.sealedAnew(files))).toBeNull();
  });

  it.each([
    ['its reason', / {10}because: 18 % drier[^\n]*\n/],
    ['its person', / {10}by: Northmere Catchment Office\n/],
    ['its date', / {10}on: 2025-03-10\n/],
  ])('is none without %s', async (_, line) => {
    const text = String(example['stoplog.yaml']);
    const files = { ...example, 'stoplog.yaml': text.replace(line, '') };
    expect(files['stoplog.yaml']).not.toBe(text);
    expect(await acceptedIn(await check.sealedAnew(files))).toBeNull();
  });

  it.each([
    ['the driver', { in: 'data/scenarios/dry-2050.csv', times: 0.99 }],
    ['the data of the calibration', { in: 'data/rain/sallow-rigg.csv', times: 0.99 }],
    ['the conditions', { in: 'runs/calibrated/daily.csv', column: 'rain_mm', times: 1.01 }],
  ])('falls when %s change', async (_, change) => {
    expect(await acceptedIn(plant({ ...fault, ...change }, example))).toBeNull();
  });

  it('falls when the window of the calibration changes', async () => {
    const files = inManifest('calibration: [2003-10-01/2009-09-30]', 'calibration: [2003-10-01/2008-09-30]');
    expect(await acceptedIn(files)).toBeNull();
  });
});
