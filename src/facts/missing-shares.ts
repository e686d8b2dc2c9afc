import { agreesAsPrinted, type PrintedNumber, printedNumber } from '../hydrology/stated/printed-number.ts';
import type { FieldPath, Manifest } from '../manifest/manifest.ts';
import type { RecordNode } from '../records/record.ts';
import type { Facts } from './facts.ts';
import type { Figure } from './figures.ts';
import type { FileProfile } from './profiles/file-profile.ts';
import type { InputProfile } from './profiles.ts';

type InputRecord = RecordNode<'inputs'>;

/** The share of missing values of an input or of one of its files, stated and counted. */
export interface MissingShare {
  /** Where it is stated, or would be. */
  readonly field: FieldPath;
  /** The file, from the manifest's folder, where shares are stated for each; else null. */
  readonly file: string | null;
  readonly stated: number | null;
  /** Where it stands in a table: path from the top of the repository, line from 1. */
  readonly at: { readonly file: string; readonly line: number } | null;
  /** Steps without a value from the first row of each file to its last: rows with a declared code, and steps that no row holds. */
  readonly missing: number;
  readonly steps: number;
  readonly found: number;
  /** Within the printed decimals; 0 and 1 say exactly none and all. False where nothing is stated. */
  readonly agrees: boolean;
}

/** Every share that an input states, or the one that it should; none where a file is not here or has rows that can't be read. */
export function missingShares(
  { field, fragment }: InputRecord,
  { files, isComplete, shareInTable }: InputProfile,
  manifest: Manifest,
): readonly MissingShare[] {
  if (!isComplete || files.some(({ problems }) => problems.total > 0)) return [];
  const place = [...field, 'missing_share'];
  const { missing_share: share } = fragment;
  const shareOf = (
    of: readonly FileProfile[],
    stated: number | undefined,
    about: Pick<MissingShare, 'field' | 'file'>,
  ) => {
    const { missing, steps } = counted(of);
    const found = steps === 0 ? 0 : missing / steps;
    const agrees = stated !== undefined && isSaid(stated, manifest.source(about.field), found);
    return { ...about, stated: stated ?? null, at: null, missing, steps, found, agrees };
  };
  if (typeof share === 'object' && 'table' in share) {
    const about = { field: [...place, 'table'], file: null };
    if (shareInTable === null) return [shareOf(files, undefined, about)];
    const { printed, ...at } = shareInTable;
    const counted = shareOf(files, printed.value, about);
    return [{ ...counted, at, agrees: holds(printed, counted.found) }];
  }
  if (typeof share !== 'object') return [shareOf(files, share, { field: place, file: null })];
  return files.map((file) =>
    shareOf([file], share.per_file[file.name], { field: [...place, 'per_file', file.name], file: file.name }),
  );
}

function counted(files: readonly FileProfile[]): Pick<MissingShare, 'missing' | 'steps'> {
  let [missing, steps] = [0, 0];
  for (const column of files.flatMap(({ columns }) => columns)) {
    missing += column.missing + column.absent;
    steps += column.values + column.missing + column.absent;
  }
  return { missing, steps };
}

function isSaid(stated: number, source: string | null, found: number): boolean {
  const printed = printedNumber(source ?? String(stated));
  return printed !== null && holds(printed, found);
}

function holds(stated: PrintedNumber, found: number): boolean {
  const { value } = stated;
  return value === 0 || value === 1 ? found === value : agreesAsPrinted({ stated, recomputed: found });
}

/** Decimals that are usual for a share. */
const usualDecimals = 4;

/** Shares that are not stated, or otherwise than the files have them. A table is left alone, and a fragment that stands for many records has no place for one's share. */
export function missingShareFigures({
  records,
  profiles,
  manifest,
}: Pick<Facts, 'records' | 'profiles' | 'manifest'>): readonly Figure[] {
  return [...profiles].flatMap(([name, profile]) => {
    const record = records.nodes.get(`inputs.${name}`) as InputRecord;
    const { missing_share: share } = record.fragment;
    if (typeof share === 'object' && 'table' in share) return [];
    const isRepeated = record.field.at(-1) !== name;
    return missingShares(record, profile, manifest).flatMap(({ field, file, stated, found, agrees }) =>
      agrees || (isRepeated && file === null)
        ? []
        : [{ record: record.id, field, stated, found: rounded(found, manifest.source(field)) }],
    );
  });
}

/** To the decimals written, at least the usual ones, and as many as show that some are missing. */
function rounded(share: number, source: string | null): number {
  const written = printedNumber(source ?? '')?.decimals ?? 0;
  const short = Number(share.toFixed(Math.max(usualDecimals, written)));
  return short === 0 || (short === 1 && share < 1) ? Number(share.toPrecision(1)) : short;
}
