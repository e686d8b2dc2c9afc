import { execFile } from 'node:child_process';
import { chmodSync } from 'node:fs';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { outsidePackage } from '../harness/outside.ts';

const run = promisify(execFile);

/** Microsoft's program for SARIF files, which knows the rules by which GitHub takes them in. */
export const multitool = outsidePackage('@microsoft/sarif-multitool-linux');

interface Said {
  readonly ruleId: string;
  readonly message: { readonly id: string; readonly arguments: readonly string[] };
}

/**
 * Errors and warnings of that program on a report, such as `GH2012 Error_MissingHelp runs[0].tool.driver.rules[3] ...`. It says nothing
 * at all of a file that breaks the schema, so that must be held against the schema first; its exit status tells nothing.
 */
export async function saidByMultitool(report: string): Promise<readonly string[]> {
  // The package's own script, which would do this, is not run when packages are installed.
  const program = join(multitool.folder, 'Sarif.Multitool');
  chmodSync(program, 0o755);
  const folder = await mkdtemp(join(tmpdir(), 'stoplog-sarif-'));
  try {
    const [given, told] = [join(folder, 'given.sarif'), join(folder, 'told.sarif')];
    await writeFile(given, report);
    // For notes it would fetch the schema from the network.
    const rules = ['--rule-kind', 'Sarif;Ghas', '--level', 'Error;Warning'];
    await run(program, ['validate', given, ...rules, '--output', told], {
      // So it needs no library of languages, and writes nothing outside this folder.
      env: { DOTNET_SYSTEM_GLOBALIZATION_INVARIANT: '1', HOME: folder, TMPDIR: folder },
      maxBuffer: 1e8,
    });
    const [{ results }] = JSON.parse(await readFile(told, 'utf8')).runs as [{ results: Said[] }];
    return results.map(({ ruleId, message }) => [ruleId, message.id, ...message.arguments].join(' '));
  } finally {
    await rm(folder, { recursive: true });
  }
}
