import { isDefined } from '../../hydrology/paired.ts';
import { agreesAsPrinted } from '../../hydrology/stated/printed-number.ts';
import { asPrinted } from '../evaluation/score-names.ts';
import { rule } from '../rule.ts';

const names: Readonly<Record<string, string>> = {
  coverage: 'coverage (P-factor)',
  relative_width: 'relative width (R-factor)',
  interval_score: 'interval score',
};

export const uncertaintyDiffers = rule({
  id: 'uncertainty.differs',
  scope: 'uncertainty',
  from: 'calibration',
  means: 'contradicted',
  statement:
    'A stated coverage (P-factor), relative width (R-factor) or interval score of a band is not the one that the files give, within its printed decimals.',
  why: 'These figures say how far a decision may trust the band. Those of calibration are nearly always better than those of days that the model never saw.',
  source: {
    basis: 'definition',
    citation:
      'Follows from the words. Formulas: Abbaspour et al. (2004) Vadose Zone J. 3:1340-1352 (standard deviation with n - 1, our choice); Gneiting & Raftery (2007) J. Am. Stat. Assoc. 102:359-378, eq. 43',
  },
  clear:
    'Find out which figure is wrong. If the band is the right one, `stoplog seal --all --figures` writes the recomputed figures.',
  check: ({ id }, { bands }) =>
    bands.flatMap(({ target, over, stated, fragment }) =>
      stated.flatMap(({ name, field, printed, recomputed, agrees, windows }) => {
        // What can't be recomputed is a broken band, which has a rule of its own.
        if (agrees || !isDefined(recomputed)) return [];
        const found = Number(recomputed.value.toPrecision(4));
        const others = windows.filter((window) => window !== over);
        const cause =
          others.length > 0
            ? ` The stated figure is that of ${others.join(' and of ')}.`
            : agreesAsPrinted({ stated: printed, recomputed: 100 * recomputed.value })
              ? ' The stated figure is in percent, where a share is meant.'
              : '';
        return {
          record: id,
          field,
          subject: `${target} ${name}`,
          stated: printed.value,
          found,
          ...(name === 'interval_score' && fragment.unit !== undefined ? { unit: fragment.unit } : {}),
          message: `The ${names[name] ?? name} of the band of ${target} over ${over} is stated as ${asPrinted(printed)}; the files give ${found}.${cause}`,
        };
      }),
    ),
});
