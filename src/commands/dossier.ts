import { resolve } from 'node:path';
import { writePackage } from '../dossier/archive/write-package.ts';
import type { DossierContent } from '../dossier/content.ts';
import { packageFiles } from '../dossier/package/package-files.ts';
import { Failure } from '../failure.ts';
import { plain } from '../reports/escape.ts';
import { textReport } from '../reports/text.ts';
import type { Context, ExitStatus } from './command.ts';
import { type Gathered, gather } from './gather.ts';
import { verifyDossier } from './verify-dossier.ts';

export interface DossierOptions {
  readonly at: string;
  readonly only?: string;
  readonly out?: string;
  readonly draft?: boolean;
  readonly bag?: boolean;
  readonly verify?: string;
}

/** `stoplog dossier`: 0 when it was written or is valid, 1 when it was refused or is not. */
export async function dossierCommand(context: Context, options: DossierOptions): Promise<ExitStatus> {
  const { verify, out, at, only } = options;
  if (verify !== undefined) return verifyDossier(context, verify);
  if (out !== undefined && /\.(?:tar|7z|rar|tar\.(?:xz|bz2|zst)|txz|tbz2?)$/i.test(out))
    throw new Failure(
      'usage',
      `\`--out ${out}\` asks for an archive of a kind that is not written.`,
      'Name a `.zip`, a `.tar.gz`, or a folder.',
    );
  if (out !== undefined)
    return gather(context, at, (gathered) => make(context, options, out, gathered), only);
  throw new Failure(
    'usage',
    '`stoplog dossier` needs to know where to write, or what to verify.',
    'Make one: stoplog dossier --out dossier.zip (or a .tar.gz, or a folder). Verify one: stoplog dossier --verify dossier.zip',
  );
}

async function make(
  context: Context,
  { draft, bag }: DossierOptions,
  out: string,
  { verdict, content }: Gathered,
): Promise<ExitStatus> {
  if (content === null || (content.draft && draft !== true)) {
    context.write(textReport(verdict, { color: context.color, extent: 'quiet' }));
    context.write(`\nNo dossier was written: ${refusal(content)}\n`);
    return 1;
  }
  const prepared = await packageFiles(content, bag === true);
  if (prepared.files === null) {
    context.write('No dossier was written: these names can’t be unpacked everywhere.\n');
    for (const problem of prepared.problems) context.write(`  ${plain(problem)}\n`);
    context.write('Rename the files, or make the dossier without `--bag`.\n');
    return 1;
  }
  const top = `dossier-${content.commit.slice(0, 12)}`;
  await writePackage(resolve(context.cwd, out), prepared.files, { top, date: new Date(content.committedAt) });
  context.write(
    `${content.draft ? 'A draft of the dossier' : 'The dossier'} of ${verdict.at} is in ${out}.\n`,
  );
  context.write(`Verify it: stoplog dossier --verify ${out}\n`);
  return 0;
}

function refusal(content: DossierContent | null): string {
  return content === null
    ? 'there is a manifest that can’t be read.'
    : 'what blocks is listed above. Clear it, or add `--draft` for a dossier that says on every page that it is none yet.';
}
