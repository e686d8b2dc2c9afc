import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import type { FieldPath, Manifest } from './manifest.ts';
import { readManifest } from './read.ts';
import { rememberedManifest } from './remembered-manifest.ts';

const top = join(import.meta.dirname, '../..');
const path = 'model/stoplog.yaml';

/** Every field of some data, and beside each one that is not there. */
function fieldsOf(data: unknown, field: FieldPath = []): FieldPath[] {
  if (typeof data !== 'object' || data === null) return [field, [...field, 'absent'], [...field, 0]];
  const below = Object.entries(data).flatMap(([key, value]) =>
    fieldsOf(value, [...field, Array.isArray(data) ? Number(key) : key]),
  );
  return [field, [...field, 'absent', 'deeper'], [...field, 99], [...field, 'constructor'], ...below];
}

/** Reads a text twice over one memory: as it is read, and as it is remembered. */
async function twice(text: string) {
  const kept = new Map<string, string>();
  const memory = {
    async remember<T>(key: string, compute: () => Promise<T>): Promise<T> {
      const known = kept.get(key) ?? JSON.stringify(await compute());
      kept.set(key, known);
      return JSON.parse(known) as T;
    },
  };
  const [first, second] = [
    await rememberedManifest(path, text, memory),
    await rememberedManifest(path, text, memory),
  ];
  return { first, second, remembered: [...kept.values()] };
}

function expectAlike(one: Manifest | null, other: Manifest | null): void {
  if (one === null || other === null) throw new Error('no manifest');
  expect(other).not.toBe(one);
  expect({ path: other.path, folder: other.folder, text: other.text }).toEqual({
    ...{ path: one.path, folder: one.folder, text: one.text },
  });
  expect(other.data).toEqual(one.data);
  const tell = ({ position, source }: Manifest) =>
    fieldsOf(one.data).map((field) => [field, position(field), source(field)]);
  expect(tell(other)).toEqual(tell(one));
}

describe('a remembered manifest', () => {
  it.each(['example-project/stoplog.yaml', 'tests/projects/loads/stoplog.yaml', 'tests/harness/sound.yaml'])(
    'is as it was read, field by field: %s',
    async (file) => {
      const text = readFileSync(join(top, file), 'utf8');
      const { second, remembered } = await twice(text);
      expect(remembered).not.toContain('null');
      expectAlike(readManifest(path, text).manifest, second.manifest);
    },
  );

  it('repeats through aliases, and takes names of every kind for names', async () => {
    const source = '{ provider: Survey, title: Rain, licence: CC-BY-4.0 }';
    const text = `stoplog: 1\nstudy: { id: a, title: "Zwölf" }\ninputs:\n  rain: { role: precipitation, source: &s ${source} }\n  constructor: { role: precipitation, source: *s }\n`;
    const { second } = await twice(text);
    expectAlike(readManifest(path, text).manifest, second.manifest);
    const inputs: object = second.manifest?.data.inputs ?? {};
    expect('toString' in inputs).toBe(false);
    expect(second.manifest?.source(['inputs', 'constructor', 'source', 'title'])).toBe('Rain');
  });

  it('with problems is read again, and tells them all each time', async () => {
    const { first, second, remembered } = await twice('stoplog: 1\nstudie: {}\nmodel: 3\n');
    expect(remembered).toEqual(['null']);
    expect(second).toEqual(first);
    expect(second.problems.length).toBeGreaterThan(1);
  });
});
