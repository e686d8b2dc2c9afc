import { chmod, mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout } from 'node:timers/promises';

/** What git gave a hook. */
export interface HookSurroundings {
  readonly cwd: string;
  readonly environment: NodeJS.ProcessEnv;
  /** What came in on standard input. */
  readonly input: string;
}

/**
 * Stops a real hook in the middle, does something there as the hook's own program would, and lets it go on.
 * `action` starts the git command that runs the hook; its failure is a failure here.
 */
export async function duringHook<Answer>(
  hookFile: string,
  action: () => Promise<unknown>,
  during: (surroundings: HookSurroundings) => Promise<Answer>,
): Promise<Answer> {
  const folder = await mkdtemp(join(tmpdir(), 'stoplog-hook-'));
  const script = `#!/bin/sh
cat > '${folder}/input'
pwd -P > '${folder}/cwd'
env -0 > '${folder}/part' && mv '${folder}/part' '${folder}/environment'
# Never longer than a test may take, even if the test was ended.
waited=0
while [ ! -e '${folder}/go' ] && [ $waited -lt 1200 ]; do sleep 0.05; waited=$((waited + 1)); done
`;
  await writeFile(hookFile, script);
  await chmod(hookFile, 0o755);
  let ended = false;
  const acting = action().finally(() => {
    ended = true;
  });
  // Its failure is thrown below, once the hook's folder is no longer needed.
  acting.catch(() => {});
  try {
    const environment = await appeared(join(folder, 'environment'), () => ended);
    const pairs = environment
      .split('\0')
      .filter((pair) => pair !== '')
      .map((pair) => [pair.slice(0, pair.indexOf('=')), pair.slice(pair.indexOf('=') + 1)]);
    return await during({
      cwd: (await readFile(join(folder, 'cwd'), 'utf8')).trim(),
      environment: Object.fromEntries(pairs),
      input: await readFile(join(folder, 'input'), 'utf8'),
    });
  } finally {
    await writeFile(join(folder, 'go'), '');
    await acting;
    await rm(hookFile);
    await rm(folder, { recursive: true });
  }
}

async function appeared(file: string, ended: () => boolean): Promise<string> {
  for (;;) {
    const over = ended();
    const text = await readFile(file, 'utf8').catch(() => null);
    if (text !== null) return text;
    if (over) throw new Error('The git command ended without running the hook.');
    await setTimeout(10);
  }
}
