import { resolve } from 'node:path';
import type { PackageReport } from '../dossier/verify/findings.ts';
import { verifyPackage } from '../dossier/verify/verify-package.ts';
import { plain } from '../reports/escape.ts';
import type { Context, ExitStatus } from './command.ts';

const shownAtMost = 50;

const inWords: Readonly<Record<PackageReport['status'], string>> = {
  valid: 'valid: every file is there, with its digest',
  'awaiting fetch':
    'awaiting fetch: what is there is right, and files that it names have to be fetched first',
  incomplete: 'incomplete: files are missing or not listed',
  broken: 'broken: it is not what it says, or is not safe to unpack',
};

/** `stoplog dossier --verify`: 0 when the package is valid. */
export async function verifyDossier(context: Context, target: string): Promise<ExitStatus> {
  const { status, problems, awaited, notes, read } = await verifyPackage(resolve(context.cwd, target));
  const lines = [
    `${target} is ${inWords[status]}.`,
    ...some(problems.map(({ file, message }) => `  ${plain(file)}: ${plain(message)}.`)),
    ...some(awaited.map(({ file, url }) => `  ${plain(file)} from ${plain(url)}`)),
    ...notes.map((note) => plain(note)),
    `${read} files were read; nothing was unpacked or fetched.`,
  ];
  context.write(`${lines.join('\n')}\n`);
  return status === 'valid' ? 0 : 1;
}

function some(lines: readonly string[]): readonly string[] {
  if (lines.length <= shownAtMost) return lines;
  return [...lines.slice(0, shownAtMost), `  and ${lines.length - shownAtMost} more`];
}
