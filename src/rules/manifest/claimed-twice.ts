import type { Facts } from '../../facts/facts.ts';
import type { Claim } from '../../records/record.ts';
import { rule } from '../rule.ts';

export const manifestClaimedTwice = rule({
  id: 'manifest.claimed-twice',
  scope: 'manifest',
  from: 'warn',
  means: null,
  statement: 'Two records, or two manifests, name one file as their own.',
  why: 'With two homes a file gets two sources, two units or two gap treatments, and it is open which holds. It is also how rain meant for calibration ends up in the validation.',
  source: { basis: 'definition', citation: 'A file is the data of one input or the output of one run.' },
  clear: 'Leave the file in one record and let the other refer to that record.',
  check(_, facts) {
    const homes = new Map<string, string>();
    return [...facts.records.nodes.values()].flatMap((record) =>
      [...record.claims.values()]
        .filter(({ own }) => own)
        .flatMap((claim) => {
          const other = otherHome(claim, homes.get(claim.path), facts);
          homes.set(claim.path, homes.get(claim.path) ?? record.id);
          return other === undefined || other === record.id
            ? []
            : {
                record: record.id,
                field: claim.field,
                subject: claim.path,
                found: other,
                message: `${claim.path} is named as its own by this record and by ${other}.`,
              };
        }),
    );
  },
});

function otherHome(claim: Claim, here: string | undefined, facts: Facts): string | undefined {
  const elsewhere = facts.claimedElsewhere.get(claim.path);
  return here ?? (elsewhere && `${elsewhere.record} of ${elsewhere.manifest}`);
}
