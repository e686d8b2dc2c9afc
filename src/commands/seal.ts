import { lstat, realpath } from 'node:fs/promises';
import { dirname, join, relative } from 'node:path';
import { evidenceFor } from '../facts/evidence.ts';
import { Failure } from '../failure.ts';
import { discoverManifests, governing } from '../manifest/discover.ts';
import { makeSeals } from '../records/make-seals.ts';
import { unreadableSeals } from '../records/refusal.ts';
import { writeSealsFile } from '../records/seals-file.ts';
import { sealReport } from '../reports/seal.ts';
import { openSnapshot } from '../repository/open-snapshot.ts';
import { openRepository, type Repository } from '../repository/repository.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { Context, ExitStatus } from './command.ts';
import { contradictionsIn } from './contradictions.ts';
import { withFigures } from './figures.ts';
import { mended, nothingMoved } from './mended.ts';
import { choose, onlyFromTop, pathOf } from './only.ts';
import { readStudies, type Study, stoplogFiles, type Unread } from './studies.ts';
import { writeFileSafely } from './write-file.ts';

export interface SealOptions {
  readonly all?: boolean;
  readonly figures?: boolean;
  readonly because?: string;
  readonly moved?: boolean;
  readonly only?: string;
}

const noFigures = { written: [], unscored: new Map<string, string>() };
const nothingDone = {
  healed: [],
  moved: nothingMoved,
  figures: [],
  unscored: noFigures.unscored,
  contradictions: [],
  written: [],
};

/** `stoplog seal`, of the work tree as `git add` would store it: 0 when all that was asked for is sealed, 1 when something was refused. Writes the seals file only, and with `--figures` the manifest. */
export async function sealCommand(
  context: Context,
  names: readonly string[],
  options: SealOptions,
): Promise<ExitStatus> {
  const repository = await openRepository(context.cwd, context.environment);
  const top = topOf(repository);
  const person = await repository.identity();
  const snapshot = await openSnapshot(
    repository,
    { kind: 'worktree' },
    { alsoUntracked: stoplogFiles, progress: context.progress },
  );
  try {
    const every = await readStudies(snapshot);
    const { studies } = choose(every, onlyFromTop(options.only, repository.here, snapshot));
    const read = theOne(studies, names, repository.here);
    const { all = false, figures = false, moved: follow = false } = options;
    const asked = (record: string): boolean =>
      all || names.some((name) => record === name || record.startsWith(`${name}.`));
    const {
      study: stated,
      written: newFigures,
      unscored,
    } = figures ? await withFigures(read, asked, snapshot, context.today) : { study: read, ...noFigures };
    const { study, healed, moved } = await mended(stated, follow, repository, snapshot);
    const isWhole = unreadableSeals(study.sealsFile) === null;
    const wasWhole = unreadableSeals(stated.sealsFile) === null;
    if (wasWhole && healed.length === 0 && names.length === 0 && !all && !follow) throw nothingAsked();
    const plan = makeSeals({
      ...study,
      wanted: all ? 'all' : names,
      because: options.because ?? null,
      person,
      today: context.today,
      evidence: await evidenceFor(study, snapshot),
    });
    const about = {
      plan,
      person,
      today: context.today,
      of: every.length > 1 ? study.manifest.path : null,
      onlyMoves: follow && names.length === 0 && !all,
    };
    // Of a seals file that can't be read in whole, entries would be lost.
    if (!isWhole) {
      context.write(sealReport({ ...about, ...nothingDone }));
      return 1;
    }
    const sealed = plan.sealed.map(({ record }) => record);
    const contradictions = await contradictionsIn(sealed, study, snapshot, context.today);
    const hasSeals = plan.seals.size > 0 || study.sealsFile.exists;
    const files: readonly (readonly [path: string, text: string])[] = [
      [study.manifest.path, study.manifest.text],
      ...(hasSeals ? [[study.sealsFile.path, writeSealsFile(plan.seals, plan.unreadable)] as const] : []),
    ];
    const changed: { readonly target: string; readonly text: string }[] = [];
    for (const [path, text] of files)
      if (text !== (await textOf(snapshot, path))) changed.push({ target: await ownPath(top, path), text });
    for (const { target, text } of changed) await writeFileSafely(target, text);
    const here = await realpath(context.cwd);
    const written = changed.map(({ target }) => relative(here, target));
    const stillHealed = healed.filter(({ record }) => !sealed.includes(record));
    const done = { healed: stillHealed, moved, figures: newFigures, unscored, contradictions, written };
    context.write(sealReport({ ...about, ...done }));
    return plan.refused.length > 0 ? 1 : 0;
  } finally {
    await snapshot.close();
  }
}

/** Where a file of ours lies, if it does not lead elsewhere: a link in a stranger's branch must not aim what we write. */
async function ownPath(top: string, path: string): Promise<string> {
  const target = join(top, path);
  const folder = await realpath(dirname(target));
  const isLink = await lstat(target).then(
    (found) => found.isSymbolicLink(),
    () => false,
  );
  if (!isLink && folder === dirname(target)) return target;
  throw new Failure(
    'cannot-seal',
    `${path} is reached through a symbolic link, so what is written there would land elsewhere.`,
    'Put the file itself in its place, then seal again. Nothing was written.',
  );
}

async function textOf(snapshot: Snapshot, path: string): Promise<string> {
  const bytes = snapshot.entries.has(path) ? await snapshot.read(path) : null;
  return bytes === null ? '' : new TextDecoder().decode(bytes);
}

function topOf({ top, gitDirectory }: Repository): string {
  if (top !== null) return top;
  throw new Failure(
    'usage',
    `${gitDirectory} has no work tree, so there is nowhere to write the seals.`,
    'Seal in a clone with a work tree.',
  );
}

/** The one manifest that is meant: whose records the names fit and, of several such, the one that governs the folder `here`. */
function theOne(studies: readonly (Study | Unread)[], names: readonly string[], here: string): Study {
  const fitting = studies.filter(
    (study) =>
      'problems' in study ||
      names.length === 0 ||
      names.some((name) =>
        [...study.records.nodes.keys()].some((id) => id === name || id.startsWith(`${name}.`)),
      ),
  );
  const meant = fitting.length > 0 ? fitting : studies;
  const governor = governing(`${here}/`, discoverManifests(studies.map(pathOf)));
  const study = meant.length === 1 ? meant[0] : meant.find((one) => pathOf(one) === governor?.path);
  if (study === undefined) {
    throw new Failure(
      'usage',
      'This repository holds several manifests, and it is not plain whose records are meant.',
      `Go into the folder of one of them, or add --only with it: ${studies.map(pathOf).join(', ')}.`,
    );
  }
  if ('problems' in study) {
    const [first] = study.problems;
    throw new Failure(
      'cannot-seal',
      `${study.path} line ${first?.line}: ${first?.message} So its records can’t be read, and nothing can be sealed.`,
      '`stoplog check` lists every fault of the manifest.',
    );
  }
  return study;
}

function nothingAsked(): Failure {
  return new Failure(
    'usage',
    'No record was named to seal.',
    'Name what you have reviewed, such as `stoplog seal inputs.rainfall`, or `stoplog seal --all`.',
  );
}
