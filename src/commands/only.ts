import { Failure } from '../failure.ts';
import type { Study, Unread } from './studies.ts';

/** What `--only` chose: some manifests, and of their findings those of some records. */
export interface Chosen {
  readonly studies: readonly (Study | Unread)[];
  /** Whether a record is among those asked about. */
  readonly includes: (record: string) => boolean;
}

/** Reads `--only`: a manifest's folder (or the manifest itself), a record, or an area. Throws Failure 'usage' when it is none of them. */
export function choose(all: readonly (Study | Unread)[], only: string | undefined): Chosen {
  if (only === undefined) return { studies: all, includes: () => true };
  const folder = only.replace(/^\.\//, '').replace(/\/+$/, '');
  const inFolder = all.filter((study) => {
    const path = pathOf(study);
    return path === folder || path.startsWith(`${folder}/`) || (folder === '.' && !path.includes('/'));
  });
  if (inFolder.length > 0) return { studies: inFolder, includes: () => true };
  const includes = (record: string): boolean => record === only || record.startsWith(`${only}.`);
  const withRecord = all.filter(
    (study) => 'problems' in study || [...study.records.nodes.keys()].some(includes),
  );
  const named = withRecord.some((study) => !('problems' in study));
  if (named || withRecord.length > 0) return { studies: withRecord, includes };
  throw new Failure(
    'usage',
    `\`--only ${only}\` names no record, no area and no manifest’s folder.`,
    `Manifests here: ${all.map(pathOf).join(', ')}. Records are written as \`inputs.rainfall\`, areas as \`inputs\`.`,
  );
}

export function pathOf(study: Study | Unread): string {
  return 'problems' in study ? study.path : study.manifest.path;
}
