import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Context } from './commands/command.ts';
import { runCommandLine } from './commands/command-line.ts';
import { progressLine } from './commands/progress-line.ts';
import { withoutCommands } from './commands/without-commands.ts';
import { Failure } from './failure.ts';
import { plain } from './reports/escape.ts';
import { version } from './version.ts';

const line = process.stderr.isTTY ? progressLine((text) => process.stderr.write(text), Date.now) : null;

const context: Context = withoutCommands({
  cwd: process.cwd(),
  environment: process.env,
  today: dateOf(process.env.SOURCE_DATE_EPOCH),
  color: wantsColor(),
  write(text) {
    line?.clear();
    process.stdout.write(text);
  },
  tell(text) {
    line?.clear();
    process.stderr.write(text);
  },
  progress: (text) => line?.show(text),
});

process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  // A reader that has seen enough (`| head`) is no failure of ours.
  if (error.code !== 'EPIPE') throw error;
});

try {
  process.exitCode = await runCommandLine(process.argv.slice(2), context);
  line?.clear();
} catch (error) {
  process.exitCode = 2;
  const failure = error instanceof Failure ? error : internal(error);
  // Names of files and words of git are a stranger's.
  const words = `stoplog could not do this.\n${failure.message}\n${failure.next}`;
  context.tell(`${words.split('\n').map(plain).join('\n')}\n`);
}

/** Today's date here, or that of SOURCE_DATE_EPOCH where a reproducible run sets it. */
function dateOf(epoch: string | undefined): string {
  const now = epoch !== undefined && /^\d+$/.test(epoch) ? new Date(Number(epoch) * 1000) : new Date();
  const local = epoch === undefined ? now.getTime() - now.getTimezoneOffset() * 60_000 : now.getTime();
  return new Date(local).toISOString().slice(0, 10);
}

function wantsColor(): boolean {
  const { NO_COLOR, FORCE_COLOR, TERM } = process.env;
  if (NO_COLOR !== undefined && NO_COLOR !== '') return false;
  if (FORCE_COLOR !== undefined && FORCE_COLOR !== '0') return true;
  return process.stdout.isTTY === true && TERM !== 'dumb';
}

/** A fault of Stoplog's own: the details go to a file, not to the screen. */
function internal(error: unknown): Failure {
  const details = error instanceof Error ? (error.stack ?? error.message) : String(error);
  const file = join(mkdtempSync(join(tmpdir(), 'stoplog-')), 'fault.txt');
  writeFileSync(file, `stoplog ${version}, node ${process.version}\n${details}\n`);
  return new Failure(
    'internal',
    'A fault in Stoplog itself stopped this run.',
    `Nothing was changed. Please report it with the details in ${file}.`,
    error,
  );
}
