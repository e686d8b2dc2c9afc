import type { VolumeFigures } from '../../facts/balances.ts';
import type { ComparedFigure } from '../../facts/stated-figure.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { agreesAsPrinted } from '../../hydrology/stated/printed-number.ts';
import type { RecordNode } from '../../records/record.ts';
import { asPrinted } from '../evaluation/score-names.ts';
import { type Draft, rule } from '../rule.ts';
import { whileAway } from '../while-away.ts';

const names: Readonly<Record<string, string>> = {
  residual_share: 'share that is left over',
  runoff_ratio: 'runoff ratio',
  evaporative_ratio: 'evaporative ratio',
  aridity: 'aridity',
  storage_change: 'change of storage',
};

export const balanceDiffers = rule({
  id: 'balance.differs',
  scope: 'balance',
  from: 'validation',
  means: 'contradicted',
  statement:
    'A stated figure of a water balance is not the one that the files give, within its printed decimals, or the balance can’t be computed from them.',
  why: 'A balance is the first proof that a model neither makes nor loses water. A figure that the outputs do not give belongs to another run or another window.',
  source: {
    basis: 'definition',
    citation:
      'Follows from the words: totals over the window, storage from the end of the step before it to the end of its last.',
  },
  clear:
    'Find out which figure is wrong. If the run is the right one, `stoplog seal --all --figures` writes the recomputed figures.',
  check: (record, { balances }) => {
    const figures = balances.get(record.name ?? '');
    if (figures === undefined) return [];
    if (!isDefined(figures.recomputed)) return asAWhole(record, figures, figures.recomputed.undefined);
    const { unit } = figures.recomputed.value;
    return figures.stated.filter(({ agrees }) => !agrees).map((one) => differing(record, one, unit));
  },
});

function asAWhole(
  { id, name, field, fragment }: RecordNode<'balance'>,
  { away }: VolumeFigures,
  reason: string,
): readonly Draft[] {
  // That the catchment's balance lacks its flows has a rule of its own.
  if (name === 'catchment' && (fragment.inflow === undefined || fragment.outflow === undefined)) return [];
  return [
    {
      record: id,
      field,
      subject: 'as a whole',
      message: `The water balance of ${name} can’t be computed: ${reason}.`,
      ...(away === null
        ? { clear: 'State file, columns, unit and window so that the balance can be computed.' }
        : whileAway(away)),
    },
  ];
}

function differing(
  { id, name: volume }: RecordNode,
  { name, field, printed, recomputed, windows }: ComparedFigure,
  unit: string,
): Draft {
  const isAmount = name === 'storage_change' || name.startsWith('totals ');
  const what = names[name] ?? `total of ${name.slice('totals '.length)}`;
  const about = {
    record: id,
    field,
    subject: name,
    stated: printed.value,
    ...(isAmount && unit !== '' ? { unit } : {}),
  };
  const said = `The ${what} of the water balance of ${volume}`;
  if (!isDefined(recomputed))
    return {
      ...about,
      // Names of terms are free, so a ratio may be right and not found.
      ...(isAmount ? {} : { from: 'warn' }),
      message: `${said} can’t be computed: ${recomputed.undefined}.`,
    };
  const found = Number(recomputed.value.toPrecision(6)) + 0;
  const fits = (value: number) => agreesAsPrinted({ stated: printed, recomputed: value });
  const cause =
    windows.length > 0
      ? ` The stated figure is that of ${windows.join(' and of ')}.`
      : fits(-recomputed.value)
        ? ' The stated figure has the other sign.'
        : !isAmount && fits(100 * recomputed.value)
          ? ' The stated figure is in percent, where a share is meant.'
          : '';
  return {
    ...about,
    found,
    message: `${said} is stated as ${asPrinted(printed)}; the files give ${found}.${cause}`,
  };
}
