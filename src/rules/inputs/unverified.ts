import type { Facts } from '../../facts/facts.ts';
import { awayBy } from '../../facts/input.ts';
import type { Elsewhere } from '../../records/record.ts';
import type { Unavailable } from '../../repository/snapshot.ts';
import { type Draft, rule } from '../rule.ts';
import { bringHere } from '../while-away.ts';

const why: Readonly<Record<Unavailable, string>> = {
  'not-fetched': 'is not in this clone (partial or shallow, or an object is missing)',
  submodule: 'belongs to a submodule, whose content is another repository’s',
  'link-outside': 'is a symbolic link that leads out of the repository',
  'link-dangling': 'is a symbolic link that leads nowhere',
  unmerged: 'is in the middle of a merge',
  'intent-to-add': 'was announced to git (add --intent-to-add), but its content was not added',
  absent: 'is not there',
};

export const inputsUnverified = rule({
  id: 'inputs.unverified',
  scope: 'manifest',
  from: 'archive',
  before: 'warn',
  means: null,
  statement:
    'A file’s content is not here (kept elsewhere, Git LFS or partial clone not fetched), so its digest could not be checked; or what lies there is another file.',
  why: 'What was not looked at is no evidence: the data on that drive or server may have been replaced since the model ran.',
  source: { basis: 'definition', citation: 'A digest is checked by reading the content.' },
  clear:
    'Fetch the content (git lfs pull, git fetch --refetch) or put the file at its path, and check again.',
  check: (_, { records, beside }) =>
    [...records.nodes.values()].flatMap(({ id, claims, elsewhere }) => [
      ...[...claims.values()].flatMap(({ path, field, identity }) => {
        const says =
          identity.kind === 'unavailable'
            ? why[identity.why]
            : identity.kind === 'pointer' && !identity.present
              ? 'is a Git LFS pointer whose content is not fetched'
              : null;
        return says === null
          ? []
          : {
              record: id,
              field,
              subject: path,
              message: `${path} ${says}, so its content could not be checked.`,
              clear: bringHere[awayBy(identity)],
            };
      }),
      ...elsewhere.flatMap((file) => keptElsewhere(id, file, beside)),
    ]),
});

/** A file that the manifest says is kept outside git: looked at where it lies at its path none the less. */
function keptElsewhere(
  record: string,
  { path, field, sha256, location }: Elsewhere,
  beside: Facts['beside'],
): readonly Draft[] {
  const draft = { record, field, subject: path };
  const where = location === undefined ? '' : ` (${location})`;
  if (sha256 === undefined) {
    return [
      {
        ...draft,
        message: `${path} is stated as a file kept outside git${where} without its SHA-256, so nothing identifies it.`,
        clear:
          'Write its `sha256` there (`sha256sum FILE` prints it). A file that git tracks is named by its path alone: [path/to/file].',
      },
    ];
  }
  const kept = `${path} is kept outside git${where}`;
  const here = beside.get(path);
  if (!here)
    return [{ ...draft, message: `${kept} and not at its path here, so its content could not be checked.` }];
  if (here.sha256 === sha256) return [];
  return [
    {
      ...draft,
      from: 'setup',
      stated: sha256,
      found: here.sha256,
      message: `The file that lies at ${path} is not the one that is stated: the SHA-256 differ.`,
    },
  ];
}
