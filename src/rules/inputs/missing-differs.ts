import { missingShares } from '../../facts/missing-shares.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';

export const inputsMissingDiffers = rule({
  id: 'inputs.missing-differs',
  scope: 'inputs',
  from: 'calibration',
  means: 'contradicted',
  statement:
    'The stated share of missing values is not the one counted in the files, within its printed decimals; 0 says that none is missing.',
  why: 'Readers judge by this share how far totals, peaks and scores can be trusted; a share that is too small hides gaps that were filled or skipped.',
  source: {
    basis: 'definition',
    citation:
      'Follows from the words: values with a declared code and steps without a row, over all steps from first to last row.',
  },
  clear:
    'Write the counted share (`stoplog seal --all --figures` does), or mend the files or `series.missing`.',
  check: (record, { profiles, manifest }) => {
    const { id, name, field, fragment } = record;
    const profile = profiles.get(name ?? '');
    if (profile === undefined || fragment.missing_share === undefined) return [];
    const shares = missingShares(record, profile, manifest);
    // What is not stated for a file says that nothing is missing there.
    const differing = shares.filter(
      ({ agrees, stated, missing }) => !agrees && (stated !== null || missing > 0),
    );
    const isRepeated = field.at(-1) !== name;
    const known = new Set(shares.map(({ file }) => file));
    const { missing_share: share } = fragment;
    const named = typeof share === 'object' && 'per_file' in share ? Object.keys(share.per_file) : [];
    const strangers = isRepeated || shares.length === 0 ? [] : named.filter((file) => !known.has(file));
    return [
      ...differing.map(({ field: place, file, stated, at, found, missing, steps }): Draft => {
        const says =
          stated === null ? 'nothing is stated for it' : `${manifest.source(place) ?? stated} is stated`;
        return {
          record: id,
          field: place,
          ...(at ?? {}),
          ...(file === null ? {} : { subject: file }),
          ...(stated === null ? {} : { stated }),
          found: Number(found.toPrecision(3)),
          message: `${figure(missing)} of ${figure(steps)} values${file === null ? '' : ` of ${file}`} are missing, a share of ${Number(found.toPrecision(3))}; ${says}.`,
        };
      }),
      ...strangers.map(
        (file): Draft => ({
          record: id,
          field: [...field, 'missing_share', 'per_file', file],
          subject: file,
          message: `A share is stated for ${file}, which is no file of this input.`,
          clear: 'Correct the path; it is written from the manifest’s folder.',
        }),
      ),
    ];
  },
});
