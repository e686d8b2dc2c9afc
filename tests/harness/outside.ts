import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { join } from 'node:path';

/** Whether an outside tool that a test checks us against is here, and why not. */
export interface Outside {
  readonly available: boolean;
  /** For the title of a skipped test; empty where the tool is here. */
  readonly reason: string;
}

/**
 * Looks for a tool by starting it (`git-lfs version`, `sha256sum --version`). Use as
 * `it.skipIf(!lfs.available)(...)`. With STOPLOG_REQUIRE_OUTSIDE=1 an absent tool is an error and not a skip.
 */
export function outside(tool: string, args: readonly string[] = ['--version']): Outside {
  const tried = spawnSync(tool, args, { stdio: 'ignore' });
  if (tried.error === undefined && tried.status === 0) return { available: true, reason: '' };
  return absent(`${tool} could not be started here (${tried.error?.message ?? `status ${tried.status}`})`);
}

/** Where the packages of tests/validators lie. */
const packages = join(import.meta.dirname, '../validators/node_modules');

/** Looks for a package of tests/validators, which `npm test` does not install; `folder` is where it lies. */
export function outsidePackage(name: string): Outside & { readonly folder: string } {
  const folder = join(packages, name);
  const found = existsSync(join(folder, 'package.json'));
  const reason = `the package ${name} is not installed in tests/validators`;
  return { folder, ...(found ? { available: true, reason: '' } : absent(reason)) };
}

function absent(reason: string): Outside {
  if (process.env.STOPLOG_REQUIRE_OUTSIDE === '1') {
    throw new Error(`${reason}, and STOPLOG_REQUIRE_OUTSIDE=1 asks for it.`);
  }
  return { available: false, reason };
}
