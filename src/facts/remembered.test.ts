import { build } from 'esbuild';
import { expect, it } from 'vitest';
import { defined } from '../hydrology/paired.ts';
import { snapshotFromMemory } from '../repository/memory.ts';
import type { Basis } from './remembered.ts';

type Module = typeof import('./remembered.ts');

/** The key under which a release of Stoplog keeps a value. */
async function keyOf(release: string, basis: Basis): Promise<string> {
  const { outputFiles } = await build({
    entryPoints: ['src/facts/remembered.ts'],
    bundle: true,
    write: false,
    platform: 'node',
    format: 'esm',
    define: { STOPLOG_VERSION: JSON.stringify(release) },
    logLevel: 'error',
  });
  const code = Buffer.from(outputFiles[0]?.contents ?? []).toString('base64');
  const { remembered }: Module = await import(`data:text/javascript;base64,${code}`);
  const keys: string[] = [];
  const snapshot = {
    ...snapshotFromMemory({}),
    remember: <T>(key: string, compute: () => Promise<T>) => {
      keys.push(key);
      return compute();
    },
  };
  await remembered(snapshot, basis, async () => defined(1));
  return keys.join();
}

it('what one release worked out is not another’s', async () => {
  const basis = { what: 'rain', version: 1, from: { blob: 'a' } };
  const keys = [await keyOf('1.0.0', basis), await keyOf('1.0.1', basis), await keyOf('1.0.0', basis)];
  expect(keys[0]).toMatch(/^[0-9a-f]{64}$/);
  expect(keys[1]).not.toBe(keys[0]);
  expect(keys[2]).toBe(keys[0]);
});
